/**
 * Pages that people read: one file of HTML that needs no network, and the same content as PDF. A page is a value ({@link
 * org.solewright.app.report.Page}) of words, tables and drawings; numbers become text here, with U+2212 for minus and as many digits
 * as their SD bears. Nothing here reads a recording or knows a use case. Templates, styles and scripts stand in the folder
 * {@code templates}; they, the fonts and the PDF libraries are loaded only when a page is asked for.
 */
@NullMarked
package org.solewright.app.report;

import org.jspecify.annotations.NullMarked;
