package org.solewright.analysis.cost;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.solewright.analysis.numerics.Root;
import org.solewright.domain.cost.WorkForm;

/**
 * Step lengths at which a given foot under its limb costs what a reference limb without foot costs, both at the same
 * speed. Between them the foot is cheaper [derived].
 *
 * @param low the shorter of the two, m; empty where there is none within reach
 * @param high the longer of the two, m; empty where there is none within reach
 */
public record FootCrossover(OptionalDouble low, OptionalDouble high) {

    private static final int GRID = 2000;

    /**
     * Simultaneous work and small angles, exactly: D = f/(1-a) (1 -+ sqrt(1 - (1-a)(1 + 1/N))), a = (l/r)^2; a = 1 leaves
     * D = f (1 + 1/N)/2.
     *
     * @param segments N, 1 or more
     * @param footLength f, along the ground, m, above 0
     * @param radius l, vault radius of the limb with the foot, m, above 0
     * @param referenceRadius r, length of the limb without foot, m, above 0
     * @return the crossovers that both limbs reach
     */
    public static FootCrossover simultaneous(int segments, double footLength, double radius, double referenceRadius) {
        double b = 1 - radius / referenceRadius * (radius / referenceRadius);
        double share = 1 + 1.0 / segments;
        double discriminant = 1 - b * share;
        if (!(discriminant >= 0)) {
            return new FootCrossover(OptionalDouble.empty(), OptionalDouble.empty());
        }
        double root = Math.sqrt(discriminant);
        double low = footLength * share / (1 + root);
        double high = footLength * (1 + root) / b;
        return new FootCrossover(
                within(low, footLength, radius, referenceRadius, 2),
                within(high, footLength, radius, referenceRadius, 2));
    }

    /**
     * Any work form, by roots of the difference over a grid from the foot length to the reach.
     *
     * @param form how the work is counted
     * @param segments N, 1 or more
     * @param footLength f, along the ground, m, above 0
     * @param radius l, vault radius of the limb with the foot, m, above 0
     * @param referenceRadius r, length of the limb without foot, m, above 0
     * @return the crossovers that both limbs reach
     */
    public static FootCrossover of(
            WorkForm form, int segments, double footLength, double radius, double referenceRadius) {
        double reach = TransitionWork.reach(form);
        double end = Math.min(footLength + reach * radius, reach * referenceRadius);
        List<Double> roots = new ArrayList<>();
        if (footLength / segments < reach * radius) {
            double before = footLength;
            for (int i = 1; i < GRID; i++) {
                double d = footLength + (end - footLength) * i / GRID;
                double low = before;
                double atLow = difference(form, segments, footLength, radius, referenceRadius, low);
                double atHigh = difference(form, segments, footLength, radius, referenceRadius, d);
                if (Math.signum(atLow) * Math.signum(atHigh) < 0) {
                    roots.add(Root.inBracket(
                            x -> difference(form, segments, footLength, radius, referenceRadius, x), low, d));
                }
                before = d;
            }
        }
        boolean startsDearer = difference(form, segments, footLength, radius, referenceRadius, footLength) > 0;
        int first = startsDearer ? 0 : -1;
        return new FootCrossover(at(roots, first), at(roots, first + 1));
    }

    private static OptionalDouble at(List<Double> roots, int index) {
        return index >= 0 && index < roots.size() ? OptionalDouble.of(roots.get(index)) : OptionalDouble.empty();
    }

    private static OptionalDouble within(double d, double foot, double radius, double reference, double reach) {
        boolean reached = d > foot && d - foot < reach * radius && d < reach * reference;
        return reached ? OptionalDouble.of(d) : OptionalDouble.empty();
    }

    private static double difference(
            WorkForm form, int segments, double foot, double radius, double reference, double d) {
        double ratio = d / reference;
        return VaultingStep.unchecked(form, segments, d, foot, radius) - TransitionWork.factor(form, ratio * ratio);
    }
}
