/**
 * From landmarks to a segmented foot: rigid fits, joint centres, model frames, inertia, contact pads; and shapes fitted
 * to points: circles and spheres, arcs in curvature form, pivots and polylines of a time-ordered path. SI units; the
 * laboratory frame L is whatever the recording has, with a stated up direction; model frames M have x forward, y up, z
 * to the subject's right. Points of shapes are flat arrays in one frame of the caller's choice, weights are relative.
 * Sources stand at each formula. No files, no events, no loads.
 */
@NullMarked
package org.solewright.analysis.fitting;

import org.jspecify.annotations.NullMarked;
