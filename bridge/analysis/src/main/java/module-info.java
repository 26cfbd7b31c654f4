/**
 * The mathematics: signals, gait, fitting and the posture-cost solver. Numbers and domain values in, numbers and domain
 * values out; no files, no console. SI units throughout.
 */
module org.solewright.analysis {
    requires transitive org.solewright.domain;
    requires static transitive org.jspecify;
    requires commons.math3;

    exports org.solewright.analysis.audit;
    exports org.solewright.analysis.cost;
    exports org.solewright.analysis.dynamics;
    exports org.solewright.analysis.fitting;
    exports org.solewright.analysis.gait;
    exports org.solewright.analysis.numerics;
}
