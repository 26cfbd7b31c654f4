/**
 * The tool's own XML files: landmark maps, foot models and posture-cost summaries. The schemas come first; the classes
 * bound to them are generated and never leave this package. Files are checked against their schema on reading and
 * before writing, without document types or anything outside the file.
 */
@NullMarked
package org.solewright.formats.footmodel;

import org.jspecify.annotations.NullMarked;
