/**
 * Dynamics of limbs: loads of joints from motion and ground reaction, plastic impacts, walking models, and the invented
 * walk whose truth is known. The invented walk's code shares nothing with the analysis that is tested on it but the
 * domain's values.
 */
@NullMarked
package org.solewright.analysis.dynamics;

import org.jspecify.annotations.NullMarked;
