/** Vectors, rotations and poses in three dimensions; lengths in metres, angles in radians. */
@NullMarked
package org.solewright.domain.geometry;

import org.jspecify.annotations.NullMarked;
