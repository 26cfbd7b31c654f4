package org.solewright.analysis.fitting;

import org.solewright.domain.foot.Landmark;

/**
 * Errors of a recording that no recording shows of itself, for Monte Carlo propagation [JCGM 101 2008]: standard
 * deviations of each component, as design 03 section 7 gives them for a human of limb length 0.9 m.
 *
 * @param footPlacement placement of landmarks of foot and malleoli, constant per session, m
 * @param legPlacement placement of epicondyles, pelvis and hip, constant per session, m
 * @param skin slow motion of a landmark over the bone, the same in every stance, m
 * @param platformHeight height of a platform, constant, m
 * @param centreOfPressure horizontal offset of a platform's centre of pressure, constant, m
 */
public record MeasurementErrors(
        double footPlacement, double legPlacement, double skin, double platformHeight, double centreOfPressure) {

    private static final double REFERENCE_LIMB = 0.9;

    /**
     * Errors for a human of limb length 0.9 m: 5 mm and 10 mm placement, 2 mm skin (published 1.8 to 4.3 mm in the foot,
     * [Tranberg Karlsson 1998]), 3 mm platform height and centre of pressure (published 2.3 to 14 mm before
     * recalibration, [Cappello 2011]).
     */
    public static final MeasurementErrors REFERENCE = new MeasurementErrors(0.005, 0.010, 0.002, 0.003, 0.003);

    /** Checks that none is negative. */
    public MeasurementErrors {
        if (!(footPlacement >= 0 && legPlacement >= 0 && skin >= 0 && platformHeight >= 0 && centreOfPressure >= 0)) {
            throw new IllegalArgumentException("measurement errors of " + footPlacement + ", " + legPlacement + ", "
                    + skin + ", " + platformHeight + ", " + centreOfPressure + " m, expected 0 m or more");
        }
    }

    /**
     * The errors of a subject of another size: those of the landmarks go with limb length, those of the platform stay.
     *
     * @param limbLength m, more than 0
     * @return scaled errors
     */
    public MeasurementErrors scaled(double limbLength) {
        double by = limbLength / REFERENCE_LIMB;
        return new MeasurementErrors(
                footPlacement * by, legPlacement * by, skin * by, platformHeight, centreOfPressure);
    }

    /**
     * Placement error of a landmark.
     *
     * @param landmark which
     * @return SD of each component, m
     */
    public double placement(Landmark landmark) {
        return landmark.compareTo(Landmark.MALLEOLUS_LATERAL) <= 0 || landmark == Landmark.TOE_TIP
                ? footPlacement
                : legPlacement;
    }
}
