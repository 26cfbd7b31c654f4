/**
 * Audits of results: what motion and loads say of each other, from the results' own columns alone. Vectors are in the
 * frame of results: x forward, y to the subject's left, z up; SI units.
 */
@NullMarked
package org.solewright.analysis.audit;

import org.jspecify.annotations.NullMarked;
