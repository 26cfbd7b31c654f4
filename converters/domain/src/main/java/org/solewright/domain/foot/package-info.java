/** Landmarks, segments, joints and the rolling contact of a segmented foot. */
@NullMarked
package org.solewright.domain.foot;

import org.jspecify.annotations.NullMarked;
