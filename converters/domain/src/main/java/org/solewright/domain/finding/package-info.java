/** What the user must be told about the data, where a number comes from, and the cautions every result carries. */
@NullMarked
package org.solewright.domain.finding;

import org.jspecify.annotations.NullMarked;
