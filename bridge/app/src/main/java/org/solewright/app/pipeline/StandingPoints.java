package org.solewright.app.pipeline;

import java.util.Optional;
import org.solewright.domain.geometry.Vec3;

/** Where the points of a recording were in standing. */
@FunctionalInterface
interface StandingPoints {

    /** Position of a label in standing, m; empty where it was not seen there. */
    Optional<Vec3> label(String label);
}
