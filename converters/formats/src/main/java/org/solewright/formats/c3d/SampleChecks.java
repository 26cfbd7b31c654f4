package org.solewright.formats.c3d;

import java.util.List;
import org.solewright.domain.finding.Finding;

/** What the samples themselves give reason to say. */
final class SampleChecks {

    private SampleChecks() {}

    static void add(C3dPoints points, List<Finding> findings) {
        if (points.written65535() > 0) {
            findings.add(Finding.note(
                    "points.flag-65535",
                    "",
                    points.written65535() + " samples carry the flag 65535, which is -1 without its sign: missing"));
        }
        if (points.outOfRange() > 0) {
            findings.add(Finding.note(
                    "points.flag-range",
                    "",
                    points.outOfRange()
                            + " samples carry a fourth word outside 16 bits: taken as valid with unknown residual"));
        }
        if (isAllMissingWithCoordinates(points)) {
            findings.add(Finding.warning(
                    "points.all-missing",
                    "",
                    "every sample is flagged missing although coordinates are stored; the flags are obeyed"));
        }
    }

    private static boolean isAllMissingWithCoordinates(C3dPoints points) {
        boolean isAnyPlaced = false;
        for (int frame = 0; frame < points.frames(); frame++) {
            for (int point = 0; point < points.points(); point++) {
                if (points.isValid(frame, point)) {
                    return false;
                }
                isAnyPlaced |= points.coordinate(frame, point, 0) != 0 || points.coordinate(frame, point, 1) != 0;
            }
        }
        return isAnyPlaced;
    }

    static void add(C3dAnalog analog, List<Finding> findings) {
        for (int channel = 0; channel < analog.channels(); channel++) {
            if (analog.isOffsetAmbiguous(channel)) {
                findings.add(Finding.warning(
                        "analog.offset-ambiguous",
                        "channel " + (channel + 1),
                        "its OFFSET is -32768 and its samples are near +32768: the offset is taken as signed; where the"
                                + " values are 65536 steps too high it was meant as +32768"));
            }
        }
    }
}
