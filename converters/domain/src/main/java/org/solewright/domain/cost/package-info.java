/** Postures, work forms and what they cost. */
@NullMarked
package org.solewright.domain.cost;

import org.jspecify.annotations.NullMarked;
