/**
 * What postures and steps cost in mechanical work: the closed forms of the solver and the mechanics of measured steps.
 */
@NullMarked
package org.solewright.analysis.cost;

import org.jspecify.annotations.NullMarked;
