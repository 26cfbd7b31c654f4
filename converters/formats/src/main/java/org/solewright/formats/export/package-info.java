/**
 * Models in other formats by templates (XSLT 3.0). A template sees the model's XML and the files of its own folder that it
 * includes, and nothing else; it may take so long and write so much. Model and output are checked: names, masses, inertia.
 */
@NullMarked
package org.solewright.formats.export;

import org.jspecify.annotations.NullMarked;
