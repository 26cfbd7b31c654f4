/**
 * Delimited tables of results: posture cost, compared postures, contacts, curves. RFC 4180 with a header row, {@code .}
 * as decimal mark, line feeds, UTF-8; an empty cell where there is no value; numbers in digits that read back as the
 * same double. Units stand in the columns' names.
 */
@NullMarked
package org.solewright.formats.table;

import org.jspecify.annotations.NullMarked;
