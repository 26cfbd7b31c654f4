/**
 * Motion from models: so far the invented walk whose truth is known. Its code shares nothing with the analysis that is
 * tested on it but the domain's values.
 */
@NullMarked
package org.solewright.analysis.dynamics;

import org.jspecify.annotations.NullMarked;
