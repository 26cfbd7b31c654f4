package org.solewright.analysis.dynamics;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.DecompositionSolver;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.NonPositiveDefiniteMatrixException;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.RealVector;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/**
 * A plastic impact of a chain: constraints come to hold at once, M (q+ - q-) = J^T P and J q+ = 0, so that P = -(J M^-1
 * J^T)^-1 J q- and the loss is half (J q-)^T (J M^-1 J^T)^-1 (J q-) [derived].
 *
 * <p>Contacts that last through the impact are rows like the new ones; leaving them out moves feet that stand.
 */
public final class PlasticImpact {

    private static final double WORST_CONDITION = 1e12;
    /** More sets of contacts than can be tried one by one. */
    private static final int MOST_CONTACTS = 12;

    private final double[] rates;
    private final double[] impulses;
    private final double loss;
    private final double before;

    private PlasticImpact(double[] rates, double[] impulses, double loss, double before) {
        this.rates = rates;
        this.impulses = impulses;
        this.loss = loss;
        this.before = before;
    }

    /** What holds after the impact. */
    public sealed interface Constraint permits Point, Lock {
        /**
         * Number of rows.
         *
         * @return 1 or 2
         */
        int rows();
    }

    /**
     * A point of a segment at rest, along both axes or along one direction.
     *
     * @param segment index, -1 for the hip
     * @param distance from its proximal end, m
     * @param direction empty for both axes, else two components
     */
    public record Point(int segment, double distance, List<Double> direction) implements Constraint {
        /** Copies the list. */
        public Point {
            direction = List.copyOf(direction);
        }

        @Override
        public int rows() {
            return direction.isEmpty() ? 2 : 1;
        }
    }

    /**
     * A joint that locks: two segments turn at one rate.
     *
     * @param first index
     * @param second index
     */
    public record Lock(int first, int second) implements Constraint {
        @Override
        public int rows() {
            return 1;
        }
    }

    /**
     * The impact of a chain.
     *
     * @param chain with the rates before
     * @param hipX forward velocity of the hip before, m/s
     * @param hipZ upward velocity of the hip before, m/s
     * @param constraints what comes to hold; may be none
     * @return the impact
     * @throws LimitException REDUNDANT_CONSTRAINTS where rows depend on one another; NO_SOLUTION for a chain without mass
     */
    public static PlasticImpact of(LimbChain chain, double hipX, double hipZ, List<Constraint> constraints)
            throws LimitException {
        int n = chain.coordinates();
        double[] q = new double[n];
        q[0] = hipX;
        q[1] = hipZ;
        for (int s = 0; s < n - LimbChain.HIP; s++) {
            q[LimbChain.HIP + s] = chain.segments().get(s).rate();
        }
        RealMatrix mass = new Array2DRowRealMatrix(chain.massMatrix(), false);
        RealVector rates = new ArrayRealVector(q, false);
        double before = rates.dotProduct(mass.operate(rates)) / 2;
        if (constraints.isEmpty()) {
            return new PlasticImpact(q, new double[0], 0, before);
        }
        RealMatrix j = new Array2DRowRealMatrix(rows(chain, constraints), false);
        if (j.getRowDimension() > n) {
            throw redundant(j.getRowDimension() + " rows of constraints on " + n + " coordinates");
        }
        DecompositionSolver inverse;
        try {
            inverse = new CholeskyDecomposition(mass, 1e-9, 0).getSolver();
        } catch (NonPositiveDefiniteMatrixException e) {
            throw new LimitException(Limit.NO_SOLUTION, "a part of the chain can move without mass: give it some");
        }
        RealMatrix back = inverse.solve(j.transpose());
        RealMatrix soft = j.multiply(back);
        double condition = new SingularValueDecomposition(soft).getConditionNumber();
        if (!(condition <= WORST_CONDITION)) {
            throw redundant(
                    Double.isFinite(condition)
                            ? String.format(
                                    Locale.ROOT,
                                    "condition %.3e of the constraints, expected at most %.0e",
                                    condition,
                                    WORST_CONDITION)
                            : "a combination of the constraints moves nothing, expected rows that differ");
        }
        RealVector closing = j.operate(rates);
        RealVector impulses =
                new LUDecomposition(soft, 0).getSolver().solve(closing).mapMultiply(-1);
        double loss = -closing.dotProduct(impulses) / 2;
        RealVector after = rates.add(back.operate(impulses));
        return new PlasticImpact(after.toArray(), impulses.toArray(), loss, before);
    }

    private static LimitException redundant(String what) {
        return new LimitException(Limit.REDUNDANT_CONSTRAINTS, what);
    }

    private static double[][] rows(LimbChain chain, List<Constraint> constraints) {
        int n = chain.coordinates();
        List<double[]> rows = new ArrayList<>();
        for (Constraint c : constraints) {
            if (c instanceof Point p) {
                boolean isFree = p.direction().isEmpty();
                double[] row = new double[n];
                chain.pointRow(
                        p.segment(),
                        p.distance(),
                        isFree ? 1 : p.direction().get(0),
                        isFree ? 0 : p.direction().get(1),
                        row);
                rows.add(row);
                if (isFree) {
                    double[] second = new double[n];
                    chain.pointRow(p.segment(), p.distance(), 0, 1, second);
                    rows.add(second);
                }
            } else if (c instanceof Lock lock) {
                double[] row = new double[n];
                row[LimbChain.HIP + lock.first()] += 1;
                row[LimbChain.HIP + lock.second()] -= 1;
                rows.add(row);
            }
        }
        return rows.toArray(double[][]::new);
    }

    /**
     * The ways an impact can end: each set of contacts that is consistent with itself, every kept contact pushing and every
     * other one leaving the ground. More than one may be; a chain that may roll over a foot or land on two has both.
     *
     * @param chain with the rates before
     * @param hipX forward velocity of the hip before, m/s
     * @param hipZ upward velocity of the hip before, m/s
     * @param contacts points that may stay on the level ground, at most 12
     * @param always what holds in every mode, such as locks
     * @return the modes, each by the contacts kept, fewest first
     * @throws LimitException NO_SOLUTION for a chain without mass
     * @throws IllegalArgumentException for more contacts than can be tried
     */
    public static List<Mode> modes(
            LimbChain chain, double hipX, double hipZ, List<Point> contacts, List<Constraint> always)
            throws LimitException {
        if (contacts.size() > MOST_CONTACTS) {
            throw new IllegalArgumentException(contacts.size() + " contacts, expected at most " + MOST_CONTACTS);
        }
        List<Mode> modes = new ArrayList<>();
        for (int size = 0; size <= contacts.size(); size++) {
            for (int set = 0; set < 1 << contacts.size(); set++) {
                if (Integer.bitCount(set) == size) {
                    Mode mode = mode(chain, hipX, hipZ, contacts, always, set);
                    if (mode.isConsistent(chain, contacts)) {
                        modes.add(mode);
                    }
                }
            }
        }
        return modes;
    }

    private static Mode mode(
            LimbChain chain, double hipX, double hipZ, List<Point> contacts, List<Constraint> always, int set)
            throws LimitException {
        List<Constraint> constraints = new ArrayList<>();
        List<Integer> kept = new ArrayList<>();
        for (int i = 0; i < contacts.size(); i++) {
            if ((set >> i & 1) == 1) {
                kept.add(i);
                constraints.add(
                        new Point(contacts.get(i).segment(), contacts.get(i).distance(), List.of()));
            }
        }
        constraints.addAll(always);
        try {
            return new Mode(kept, Optional.of(of(chain, hipX, hipZ, constraints)));
        } catch (LimitException e) {
            if (e.limit() == Limit.REDUNDANT_CONSTRAINTS) {
                return new Mode(kept, Optional.empty());
            }
            throw e;
        }
    }

    /**
     * One way an impact can end.
     *
     * @param kept indices of the contacts that stay
     * @param impact what happens; empty where the contacts depend on one another
     */
    public record Mode(List<Integer> kept, Optional<PlasticImpact> impact) {

        private static final double ROUNDING = 1e-9;

        /** Copies the list. */
        public Mode {
            kept = List.copyOf(kept);
        }

        private boolean isConsistent(LimbChain chain, List<Point> contacts) {
            if (impact.isEmpty()) {
                return false;
            }
            PlasticImpact i = impact.get();
            for (int k = 0; k < kept.size(); k++) {
                if (i.impulses[2 * k + 1] < -ROUNDING) {
                    return false;
                }
            }
            double[] row = new double[chain.coordinates()];
            for (int c = 0; c < contacts.size(); c++) {
                if (!kept.contains(c)) {
                    chain.pointRow(contacts.get(c).segment(), contacts.get(c).distance(), 0, 1, row);
                    double leaving = 0;
                    for (int d = 0; d < row.length; d++) {
                        leaving += row[d] * i.rates[d];
                    }
                    if (leaving < -ROUNDING) {
                        return false;
                    }
                }
            }
            return true;
        }
    }

    /**
     * Forward velocity of the hip after.
     *
     * @return m/s
     */
    public double hipX() {
        return rates[0];
    }

    /**
     * Upward velocity of the hip after.
     *
     * @return m/s
     */
    public double hipZ() {
        return rates[1];
    }

    /**
     * Rate of a segment after.
     *
     * @param segment index
     * @return rad/s
     */
    public double rate(int segment) {
        return rates[LimbChain.HIP + segment];
    }

    /**
     * Impulses, in the order of the rows of the constraints.
     *
     * @return a copy, N s (locks: N m s)
     */
    public double[] impulses() {
        return impulses.clone();
    }

    /**
     * Kinetic energy lost.
     *
     * @return J, not negative
     */
    public double loss() {
        return loss;
    }

    /**
     * Kinetic energy before.
     *
     * @return J
     */
    public double energyBefore() {
        return before;
    }

    /**
     * Kinetic energy after.
     *
     * @return J
     */
    public double energyAfter() {
        return before - loss;
    }
}
