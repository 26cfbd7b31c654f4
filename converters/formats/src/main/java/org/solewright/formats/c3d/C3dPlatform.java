package org.solewright.formats.c3d;

import java.util.List;
import org.solewright.domain.geometry.Vec3;

/**
 * A force platform as a file stores it, in the file's length unit.
 *
 * @param number from 1
 * @param type platform type of the format
 * @param corners four corners; not finite where not stored
 * @param origin ORIGIN as stored
 * @param channels analog channels, from 1; 0 where not stored
 * @param calibration CAL_MATRIX of this platform in stored order, column by column; empty where none is stored
 * @param calibrationRows first dimension of CAL_MATRIX; 0 where none is stored
 */
public record C3dPlatform(
        int number,
        int type,
        List<Vec3> corners,
        Vec3 origin,
        List<Integer> channels,
        List<Double> calibration,
        int calibrationRows) {

    /** Copies the lists. */
    public C3dPlatform {
        corners = List.copyOf(corners);
        channels = List.copyOf(channels);
        calibration = List.copyOf(calibration);
    }
}
