package org.solewright.app.pipeline;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.solewright.analysis.fitting.ErrorDraw;
import org.solewright.analysis.fitting.MeasurementErrors;
import org.solewright.analysis.fitting.StandingLimb;
import org.solewright.analysis.fitting.StandingPosture;
import org.solewright.analysis.numerics.Sample;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.foot.FittedNumber;

/**
 * Uncertainty of the numbers of one foot: what placement of landmarks, skin motion and platforms do to them, by a seeded
 * Monte Carlo [JCGM 101 2008], and how they scatter over stances. The result depends on seed and number of runs alone,
 * not on the number of threads.
 */
final class FitUncertainty {

    /** Two-sided 95 % point of the normal distribution. */
    private static final double NORMAL_95 = 1.959963984540054;

    private static final int FEWEST_FOR_INTERVAL = 3;
    private static final int FEWEST_RUNS = 2;

    /** How a limb comes from standing landmarks. */
    @FunctionalInterface
    interface Builder {
        /** The limb; empty where these landmarks make none. */
        Optional<StandingLimb> build(StandingPosture posture);
    }

    private final StandingLimb limb;
    private final Map<String, double[]> nominal;
    private final Map<String, double[]> drawn = new LinkedHashMap<>();
    private final int runs;

    private FitUncertainty(StandingLimb limb, FitNumbers nominal, List<Optional<FitNumbers>> draws) {
        this.limb = limb;
        this.nominal = nominal.values();
        List<Map<String, double[]>> known =
                draws.stream().flatMap(Optional::stream).map(FitNumbers::values).toList();
        runs = known.size();
        this.nominal.forEach((name, own) -> {
            double[] values = new double[runs];
            for (int run = 0; run < runs; run++) {
                double[] other = known.get(run).get(name);
                values[run] = other == null ? Double.NaN : meanWhereKnown(other, own);
            }
            drawn.put(name, values);
        });
    }

    /**
     * Works out the numbers of one foot.
     *
     * @param limb as it was fitted
     * @param posture the standing landmarks behind it
     * @param builder makes other limbs of moved landmarks
     * @param stances its stances
     * @param runs number of Monte Carlo runs; 0: none
     * @param seed of the runs
     * @return what is known
     */
    static FitUncertainty of(
            StandingLimb limb,
            StandingPosture posture,
            Builder builder,
            List<StanceMotion> stances,
            int runs,
            long seed) {
        MeasurementErrors errors =
                MeasurementErrors.REFERENCE.scaled(limb.limbLength().value());
        FitNumbers nominal = FitNumbers.of(stances, ErrorDraw.NONE, limb, posture);
        List<Optional<FitNumbers>> draws = new ArrayList<>();
        ExecutorService pool = Executors.newFixedThreadPool(Runtime.getRuntime().availableProcessors());
        try {
            List<Future<Optional<FitNumbers>>> ahead = new ArrayList<>();
            for (int run = 0; run < runs; run++) {
                ErrorDraw draw = new ErrorDraw(errors, seed, run);
                ahead.add(pool.submit(() -> one(draw, limb, posture, builder, stances)));
            }
            for (Future<Optional<FitNumbers>> future : ahead) {
                draws.add(future.get());
            }
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IllegalStateException("stopped", e);
        } catch (ExecutionException e) {
            throw new IllegalStateException(e.getCause());
        } finally {
            pool.shutdownNow();
        }
        return new FitUncertainty(limb, nominal, draws);
    }

    private static Optional<FitNumbers> one(
            ErrorDraw draw, StandingLimb limb, StandingPosture posture, Builder builder, List<StanceMotion> stances) {
        StandingPosture placed = draw.placed(posture);
        return builder.build(placed)
                .map(l -> l.withHipMoved(draw.hip(limb.side()), posture.up()))
                .map(l -> FitNumbers.of(stances, draw, l, placed));
    }

    /** Mean over the stances that the measured recording has. */
    private static double meanWhereKnown(double[] values, double[] own) {
        double sum = 0;
        int n = 0;
        for (int i = 0; i < values.length; i++) {
            if (!Double.isNaN(own[i])) {
                sum += values[i];
                n++;
            }
        }
        return n == 0 ? Double.NaN : sum / n;
    }

    /** Number of runs that gave a limb. */
    int runs() {
        return runs;
    }

    /**
     * Uncertainty of a number by Monte Carlo: root mean square of the runs about the measured value, not about their own
     * mean. Errors do not only scatter an extreme of a curve, they move it outwards; the measured one has been moved like
     * that already. Empty where it is not known.
     */
    OptionalDouble measurementSd(String name) {
        double[] own = nominal.get(name);
        double[] values = drawn.getOrDefault(name, new double[0]);
        double measured = own == null ? Double.NaN : meanWhereKnown(own, own);
        double squares = 0;
        int n = 0;
        for (double v : values) {
            if (!Double.isNaN(v)) {
                squares += (v - measured) * (v - measured);
                n++;
            }
        }
        return n < FEWEST_RUNS || Double.isNaN(measured)
                ? OptionalDouble.empty()
                : OptionalDouble.of(Math.sqrt(squares / n));
    }

    /** Root mean square of the SDs of three components. */
    OptionalDouble componentSd(String name, double degreesOfFreedom) {
        OptionalDouble x = measurementSd(name + "_x");
        OptionalDouble y = measurementSd(name + "_y");
        OptionalDouble z = measurementSd(name + "_z");
        if (x.isEmpty() || y.isEmpty() || z.isEmpty()) {
            return OptionalDouble.empty();
        }
        double squares = x.getAsDouble() * x.getAsDouble()
                + y.getAsDouble() * y.getAsDouble()
                + z.getAsDouble() * z.getAsDouble();
        return OptionalDouble.of(Math.sqrt(squares / degreesOfFreedom));
    }

    /**
     * All that is known of a number.
     *
     * @param name of the numbers of {@link FitNumbers}
     * @param unit its unit in the table
     * @param factor unit per SI unit
     * @param basis where it comes from
     * @param value in SI units, as the model has it; NaN: the mean over the stances
     * @return the row; empty where no stance gives the number
     */
    Optional<FittedNumber> number(String name, String unit, double factor, Basis basis, double value) {
        double[] own = nominal.get(name);
        if (own == null) {
            return Optional.empty();
        }
        double mean = meanWhereKnown(own, own);
        double shown = Double.isNaN(value) ? mean : value;
        if (Double.isNaN(shown)) {
            return Optional.empty();
        }
        boolean isWalking = isOfStances(name);
        int n = 0;
        double squares = 0;
        for (double v : own) {
            n += Double.isNaN(v) ? 0 : 1;
            squares += Double.isNaN(v) ? 0 : (v - mean) * (v - mean);
        }
        OptionalDouble stances = !isWalking
                ? OptionalDouble.empty()
                : n > 1 ? OptionalDouble.of(Math.sqrt(squares / (n - 1))) : within(name);
        OptionalDouble measured = measurementSd(name);
        OptionalDouble sd = total(measured, stances, n);
        OptionalDouble half = half(measured, stances, n, isWalking);
        boolean isAngle = unit.equals("deg") && n > 1;
        return Optional.of(new FittedNumber(
                limb.side(),
                name,
                unit,
                basis,
                factor * shown,
                times(sd, factor),
                times(measured, factor),
                times(stances, factor),
                n > 1,
                isWalking ? n : 0,
                half.isPresent() ? OptionalDouble.of(factor * (shown - half.getAsDouble())) : OptionalDouble.empty(),
                half.isPresent() ? OptionalDouble.of(factor * (shown + half.getAsDouble())) : OptionalDouble.empty(),
                isAngle ? times(sd, factor * NORMAL_95 * Math.sqrt(2)) : OptionalDouble.empty()));
    }

    private static boolean isOfStances(String name) {
        return name.startsWith("arc.") || name.startsWith("angle.") || name.equals("effective_foot_length");
    }

    private OptionalDouble within(String name) {
        double[] block = nominal.get(name + "_within");
        double sd = block == null ? Double.NaN : meanWhereKnown(block, block);
        return Double.isNaN(sd) ? OptionalDouble.empty() : OptionalDouble.of(sd);
    }

    private static OptionalDouble times(OptionalDouble value, double factor) {
        return value.isPresent() ? OptionalDouble.of(factor * value.getAsDouble()) : value;
    }

    /** SD of the value: of the mean over stances, and of what every stance has in common. */
    private static OptionalDouble total(OptionalDouble measured, OptionalDouble stances, int n) {
        if (measured.isEmpty() && stances.isEmpty()) {
            return OptionalDouble.empty();
        }
        double own = measured.orElse(0);
        double spread = stances.orElse(0);
        return OptionalDouble.of(Math.sqrt(own * own + spread * spread / Math.max(1, n)));
    }

    /** Half of the 95 % interval: by t over stances, none for fewer than three. */
    private static OptionalDouble half(OptionalDouble measured, OptionalDouble stances, int n, boolean isWalking) {
        if (measured.isEmpty() || (isWalking && n < FEWEST_FOR_INTERVAL)) {
            return OptionalDouble.empty();
        }
        double own = NORMAL_95 * measured.getAsDouble();
        double spread = isWalking
                ? new Sample(n, 0, OptionalDouble.of(stances.orElse(0)))
                        .half95()
                        .orElse(0)
                : 0;
        return OptionalDouble.of(Math.hypot(own, spread));
    }

    /** Names of all numbers, in order. */
    List<String> names() {
        return List.copyOf(nominal.keySet());
    }
}
