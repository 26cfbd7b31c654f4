/**
 * Numerical methods that know nothing of gait: roots, minima, small linear systems, filters, gaps,
 * sampled curves. Numbers in, numbers out; matrices
 * are flat and row-major.
 */
@NullMarked
package org.solewright.analysis.numerics;

import org.jspecify.annotations.NullMarked;
