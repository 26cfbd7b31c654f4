/**
 * What all formats share: the error for bytes that are not as the format says, atomic output. No format of its own.
 */
@NullMarked
package org.solewright.formats.io;

import org.jspecify.annotations.NullMarked;
