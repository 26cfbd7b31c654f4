package org.solewright.domain.cost;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;

/**
 * A way of standing on the same hip, thigh, shank and foot.
 *
 * @param kind which
 * @param segments number of foot segments; empty for a rolling foot
 */
public record Posture(Kind kind, OptionalInt segments) {

    /** Most segments of the plantigrade foot in tables. */
    public static final int MOST_SEGMENTS = 6;

    /** The kinds of posture. */
    public enum Kind {
        /** A point foot at the same hip height: what the foot saves. */
        COMPASS,
        /** The foot lies flat and rolls over segments. */
        PLANTIGRADE,
        /** The foot rolls on an arc. */
        ROLLING_ARC,
        /** The heel is raised; the toes bear. */
        DIGITIGRADE,
        /** Only the tip of the toe bears. */
        UNGULIGRADE
    }

    /**
     * All postures in the order of tables.
     *
     * @return compass, plantigrade with 1 to 6 segments, rolling arc, digitigrade, unguligrade
     */
    public static List<Posture> all() {
        List<Posture> all = new ArrayList<>();
        all.add(new Posture(Kind.COMPASS, OptionalInt.of(0)));
        for (int n = 1; n <= MOST_SEGMENTS; n++) {
            all.add(new Posture(Kind.PLANTIGRADE, OptionalInt.of(n)));
        }
        all.add(new Posture(Kind.ROLLING_ARC, OptionalInt.empty()));
        all.add(new Posture(Kind.DIGITIGRADE, OptionalInt.of(1)));
        all.add(new Posture(Kind.UNGULIGRADE, OptionalInt.of(0)));
        return all;
    }

    /**
     * The word used in files.
     *
     * @return such as {@code plantigrade_2}
     */
    public String word() {
        return switch (kind) {
            case COMPASS -> "compass";
            case PLANTIGRADE -> "plantigrade_" + segments.orElseThrow();
            case ROLLING_ARC -> "rolling_arc";
            case DIGITIGRADE -> "digitigrade";
            case UNGULIGRADE -> "unguligrade";
        };
    }
}
