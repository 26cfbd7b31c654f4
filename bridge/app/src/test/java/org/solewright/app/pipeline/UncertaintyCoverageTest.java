package org.solewright.app.pipeline;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.Random;
import java.util.TreeMap;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.solewright.analysis.dynamics.WalkRecorder.BodyPoint;
import org.solewright.analysis.fitting.InertiaTable;
import org.solewright.domain.foot.FittedNumber;
import org.solewright.domain.foot.Population;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.PlatformLoads;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.PointTrack;
import org.solewright.domain.motion.Recording;

/**
 * An invented foot, recorded with errors of the kinds of design 03 section 7 that are drawn here by a generator of this
 * test's own: how often the stated 95 % intervals hold the numbers of the recording without errors.
 * {@code -Dsolewright.coverage=200} runs as many as the full study.
 */
class UncertaintyCoverageTest {

    private static final int DRAWS = Integer.getInteger("solewright.coverage", 16);
    private static final List<DemoStudy.Walk> WALKS = List.of(
            new DemoStudy.Walk("walk-1", 0.58, 1.08),
            new DemoStudy.Walk("walk-2", 0.60, 1.11),
            new DemoStudy.Walk("walk-3", 0.62, 1.14),
            new DemoStudy.Walk("walk-4", 0.64, 1.17));

    private static FitUseCase.Result clean;

    @BeforeAll
    static void fitWithoutErrors() throws UseCaseException {
        clean = fit(null, 0);
    }

    private static FitUseCase.Result fit(@org.jspecify.annotations.Nullable Errors errors, int runs)
            throws UseCaseException {
        GaitOptions options = new GaitOptions(
                List.of(Path.of("standing")),
                List.of(Path.of("walking")),
                Path.of("map"),
                OptionalDouble.of(DemoStudy.MASS),
                OptionalDouble.empty(),
                Population.ADULT,
                Optional.empty(),
                Optional.empty(),
                OptionalDouble.of(0),
                false,
                OptionalDouble.empty(),
                0,
                false,
                0,
                "platform",
                Optional.empty());
        FitUseCase.Request request = new FitUseCase.Request(
                options,
                EnumSet.of(Side.RIGHT),
                false,
                OptionalInt.of(2),
                InertiaTable.DE_LEVA,
                FitUseCase.Division.DEFAULT,
                "",
                "test",
                runs,
                7);
        List<Recording> walking = new ArrayList<>();
        for (DemoStudy.Walk walk : WALKS) {
            Recording seen = walk.recorder().walking(placed(errors, false));
            walking.add(errors == null ? seen : errors.on(seen));
        }
        Recording standing = WALKS.get(0).recorder().standing("standing", 20, placed(errors, true));
        return FitUseCase.of(request, DemoStudy.map(), List.of(standing), walking);
    }

    private static List<BodyPoint> placed(@org.jspecify.annotations.Nullable Errors errors, boolean isStanding) {
        List<BodyPoint> points = DemoStudy.points(isStanding);
        return errors == null
                ? points
                : points.stream()
                        .map(p -> new BodyPoint(
                                p.label(), p.side(), p.carrier(), p.place().plus(errors.placement(p.label()))))
                        .toList();
    }

    /** One session's errors: 5 and 10 mm of placement, 2 mm of skin, 3 mm of platforms (design 03 section 7). */
    private static final class Errors {
        private final Random random;
        private final Map<String, Vec3> placement = new TreeMap<>();
        private final Map<String, Vec3[]> skin = new TreeMap<>();
        private final Vec3[] platform = new Vec3[3];

        Errors(long seed) {
            random = new Random(seed);
            for (int i = 0; i < platform.length; i++) {
                platform[i] = vector(0.003);
            }
        }

        private Vec3 vector(double sd) {
            return new Vec3(sd * random.nextGaussian(), sd * random.nextGaussian(), sd * random.nextGaussian());
        }

        Vec3 placement(String label) {
            String name = label.substring(1);
            // The demo takes the trochanter for the hip: its placement and the error of the hip in it, 10 mm each.
            double sd = name.equals("TRO")
                    ? 0.010 * Math.sqrt(2)
                    : name.startsWith("KN") ? 0.010 : name.startsWith("SH") || name.startsWith("TH") ? 0 : 0.005;
            return placement.computeIfAbsent(label, l -> vector(sd));
        }

        /** Cosines of 0, 1 and 2 half periods over each stance, 2 mm rms per component. */
        private Vec3 skin(String label, double share) {
            Vec3[] terms = skin.computeIfAbsent(label, l -> {
                double sd = 0.002 / Math.sqrt(2);
                return new Vec3[] {vector(sd), vector(sd), vector(sd)};
            });
            return terms[0].plus(terms[1].times(Math.cos(Math.PI * share)))
                    .plus(terms[2].times(Math.cos(2 * Math.PI * share)));
        }

        Recording on(Recording r) {
            List<PointTrack> points = new ArrayList<>();
            for (PointTrack p : r.points()) {
                double[] xyz = new double[3 * r.frames()];
                p.copyTo(xyz, 0);
                Side side = p.label().startsWith("L") ? Side.LEFT : Side.RIGHT;
                for (int frame = 0; frame < r.frames(); frame++) {
                    Vec3 e = skin(p.label(), share(r, side, r.time(frame)));
                    xyz[3 * frame] += e.x();
                    xyz[3 * frame + 1] += e.y();
                    xyz[3 * frame + 2] += e.z();
                }
                points.add(PointTrack.of(p.label(), xyz));
            }
            List<PlatformLoads> platforms = new ArrayList<>();
            for (PlatformLoads p : r.platforms()) {
                double[] force = new double[3 * p.samples()];
                double[] moment = new double[3 * p.samples()];
                p.copyForceTo(force, 0);
                p.copyMomentTo(moment, 0);
                Vec3 by = platform[p.number()];
                platforms.add(new PlatformLoads(
                        p.number(),
                        p.type(),
                        p.corners().stream().map(c -> c.plus(by)).toList(),
                        p.up(),
                        p.rate(),
                        p.time(0),
                        true,
                        force,
                        moment));
            }
            return new Recording(
                    r.name(), r.rate(), r.firstFrame(), r.frames(), points, platforms, r.events(), List.of());
        }

        private static double share(Recording r, Side side, double time) {
            for (ContactRow c : clean.contacts()) {
                if (c.trial().equals(r.name()) && c.side() == side) {
                    return Math.max(0, Math.min(1, (time - c.start()) / (c.end() - c.start())));
                }
            }
            return 0;
        }
    }

    @Test
    void intervalsHoldTheTruthAboutAsOftenAsTheySay() throws UseCaseException {
        Map<String, Double> truth = new TreeMap<>();
        clean.numbers().forEach(n -> truth.put(n.quantity(), n.value()));
        Map<String, int[]> inside = new TreeMap<>();
        int all = 0;
        int held = 0;
        for (int draw = 0; draw < DRAWS; draw++) {
            for (FittedNumber n :
                    fit(new Errors(1000 + draw), DRAWS < 100 ? 60 : 100).numbers()) {
                Double exact = truth.get(n.quantity());
                if (exact == null || n.low().isEmpty()) {
                    continue;
                }
                boolean isInside =
                        n.low().getAsDouble() <= exact && exact <= n.high().orElseThrow();
                int[] count = inside.computeIfAbsent(n.quantity(), q -> new int[2]);
                count[0] += isInside ? 1 : 0;
                count[1]++;
                held += isInside ? 1 : 0;
                all++;
            }
        }
        StringBuilder table = new StringBuilder();
        inside.forEach((name, c) -> table.append(String.format("%n%-36s %d of %d", name, c[0], c[1])));
        if (DRAWS >= 100) {
            System.out.println(
                    "coverage of 95 % intervals, seeds 1000 to " + (999 + DRAWS) + ": " + held + " of " + all + table);
        }
        assertThat(inside).as("numbers with an interval").hasSizeGreaterThan(15);
        // The errors are drawn from the stated distributions: 95 % within four binomial SDs of the draws, taken as if
        // the numbers of a draw were one.
        double sd = Math.sqrt(0.95 * 0.05 / DRAWS);
        assertThat(held / (double) all).as(table.toString()).isBetween(0.95 - 4 * sd, 1.0);
        inside.forEach(
                (name, c) -> assertThat(c[0] / (double) c[1]).as(name + table).isGreaterThan(0.95 - 5 * sd));
    }
}
