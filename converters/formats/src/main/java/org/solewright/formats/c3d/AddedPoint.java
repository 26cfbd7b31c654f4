package org.solewright.formats.c3d;

import org.solewright.domain.motion.PointTrack;

/**
 * A computed point that is added to a file.
 *
 * @param track its places in metres, laboratory frame, as many frames as the file has
 * @param description what it is and how it was computed
 */
public record AddedPoint(PointTrack track, String description) {}
