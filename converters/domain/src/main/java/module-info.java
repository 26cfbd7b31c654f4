/**
 * The values that all other modules speak in: geometry, motion, loads, the foot, costs and findings.
 *
 * <p>In: immutable values with their invariants. Not in: files, algorithms, text for a console. Everything is SI
 * (m, kg, s, Hz, N, N·m, J, rad). The module rests on the JDK alone; nullness annotations are needed at compile time
 * only.
 */
module org.solewright.domain {
    requires static transitive org.jspecify;

    exports org.solewright.domain.finding;
    exports org.solewright.domain.geometry;
    exports org.solewright.domain.motion;
    exports org.solewright.domain.gait;
    exports org.solewright.domain.foot;
    exports org.solewright.domain.cost;
    exports org.solewright.domain.study;
}
