package org.solewright.app.pipeline;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.net.URISyntaxException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.foot.Population;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.CurveRow;
import org.solewright.formats.io.FormatException;

/** Areas of printed limb powers are the printed works within 0.5 % (design 05). */
class PowerAreasTest {

    private static final double SHARE = 0.005;
    private static final double SMALL = 0.01;

    @TempDir
    private Path folder;

    private static AppraiseUseCase.Result appraised(List<Path> walking, Path map, double cutoff)
            throws UseCaseException, FormatException {
        return AppraiseUseCase.run(new AppraiseUseCase.Request(
                new GaitOptions(
                        List.of(),
                        walking,
                        map,
                        OptionalDouble.empty(),
                        OptionalDouble.empty(),
                        Population.UNKNOWN,
                        Optional.empty(),
                        Optional.empty(),
                        OptionalDouble.empty(),
                        false,
                        OptionalDouble.empty(),
                        cutoff,
                        false,
                        0,
                        "platform",
                        Optional.empty()),
                Optional.empty(),
                List.of(),
                List.of(),
                "test"));
    }

    @Test
    void areasOfTheInventedWalkAreItsWorks() throws UseCaseException, FormatException {
        DemoStudy.Files files = DemoStudy.write(folder);
        check(appraised(files.walking(), files.landmarks(), 0));
    }

    @Test
    void areasOfARealRecordingAreItsWorks() throws URISyntaxException, UseCaseException, FormatException {
        Optional<Path> files =
                SharedFolder.find().map(s -> s.resolve("c3d").resolve("files")).filter(Files::isDirectory);
        assumeTrue(files.isPresent(), "the shared recordings are not beside this checkout");
        Path map = Path.of(PowerAreasTest.class
                .getResource("/org/solewright/app/s26-landmarks.xml")
                .toURI());
        List<Path> walking = new ArrayList<>();
        for (int walk = 1; walk <= 3; walk++) {
            walking.add(files.get().resolve("s26-walking-hybrid-1-" + walk + ".c3d"));
        }
        check(appraised(walking, map, GaitOptions.DEFAULT_MARKER_CUTOFF));
    }

    private static void check(AppraiseUseCase.Result result) {
        int checked = 0;
        for (TransitionRow row : result.cost().rows()) {
            if (row.text("trial").orElse("").equals("*")) {
                continue;
            }
            List<Double> trailing = runs(result, row, "trailing-limb-power", "trailing_side");
            List<Double> leading = runs(result, row, "leading-limb-power", "side");
            // The last positive phase of the trailing, the first three phases of the leading limb.
            checked += same(row, "push_off_J", trailing.get(trailing.size() - 1));
            checked += same(row, "collision_J", leading.get(0));
            checked += same(row, "rebound_J", leading.get(1));
            checked += same(row, "preload_J", leading.get(2));
        }
        assertThat(checked).isGreaterThanOrEqualTo(8);
    }

    private static int same(TransitionRow row, String column, double area) {
        OptionalDouble work = row.number(column);
        if (work.isEmpty()) {
            return 0;
        }
        assertThat(area)
                .as(row.text("trial").orElse("") + " " + column)
                .isCloseTo(work.getAsDouble(), within(SHARE * Math.abs(work.getAsDouble())));
        return 1;
    }

    /** Areas between zero crossings, those under 1 % of all merged into their neighbours. */
    private static List<Double> runs(AppraiseUseCase.Result result, TransitionRow row, String curve, String side) {
        ContactRow contact = result.contacts().stream()
                .filter(c -> c.trial().equals(row.text("trial").orElse(""))
                        && c.side().word().equals(row.text(side).orElse("")))
                .findFirst()
                .orElseThrow();
        double[] p = result.curves().stream()
                .filter(r -> r.trial().equals(row.text("trial").orElse(""))
                        && r.step().equals(row.text("step").orElse(""))
                        && r.curve().equals(curve))
                .mapToDouble(CurveRow::mean)
                .filter(v -> !Double.isNaN(v))
                .toArray();
        double h = (contact.end() - contact.start()) / 100;
        List<Double> runs = new ArrayList<>();
        double area = 0;
        for (int i = 0; i + 1 < p.length; i++) {
            if (p[i] == 0 && area != 0) {
                runs.add(area);
                area = p[i + 1] * h / 2;
            } else if (p[i] * p[i + 1] < 0) {
                double share = p[i] / (p[i] - p[i + 1]);
                runs.add(area + p[i] * share * h / 2);
                area = p[i + 1] * (1 - share) * h / 2;
            } else {
                area += (p[i] + p[i + 1]) / 2 * h;
            }
        }
        runs.add(area);
        double all = runs.stream().mapToDouble(Math::abs).sum();
        while (true) {
            int least = 0;
            for (int i = 0; i < runs.size(); i++) {
                least = Math.abs(runs.get(i)) < Math.abs(runs.get(least)) ? i : least;
            }
            if (Math.abs(runs.get(least)) >= SMALL * all || runs.size() == 1) {
                return runs;
            }
            List<Double> near = runs.subList(Math.max(0, least - 1), Math.min(runs.size(), least + 2));
            double sum = near.stream().mapToDouble(v -> v).sum();
            near.clear();
            near.add(sum);
        }
    }
}
