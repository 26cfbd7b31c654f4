package org.solewright.domain.foot;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.gait.Side;

/**
 * The roll-over check of one subject: what each stance showed, means over the stances of a foot, the observation in words.
 * A table, a document or a page prints it as it is; numbers are SI, shares of stance 0 to 1.
 *
 * @param version version of the tool
 * @param subject identifier of the subject
 * @param isHuman whether the subject is a person; then no stance has a posture
 * @param sources inputs
 * @param settings options and defaults that shaped the result
 * @param feet the feet that were checked, left before right
 * @param comparisons published figures with their sources
 * @param findings what has to be said about the data
 * @param cautions sentences every reader must see
 */
public record RollOverSheet(
        String version,
        String subject,
        boolean isHuman,
        List<SourceFile> sources,
        List<Setting> settings,
        List<Foot> feet,
        List<Comparison> comparisons,
        List<Finding> findings,
        List<String> cautions) {

    /** Copies the lists. */
    public RollOverSheet {
        sources = List.copyOf(sources);
        settings = List.copyOf(settings);
        feet = List.copyOf(feet);
        comparisons = List.copyOf(comparisons);
        findings = List.copyOf(findings);
        cautions = List.copyOf(cautions);
    }

    /**
     * An option or default.
     *
     * @param name with its unit where it has one, such as {@code marker_low_pass_Hz}
     * @param value as text
     * @param basis {@code given} or {@code default}
     */
    public record Setting(String name, String value, String basis) {}

    /**
     * One foot.
     *
     * @param side whose foot
     * @param limbLength hip centre to floor in standing, of the model, m
     * @param footLength of the model, m; empty where it has none
     * @param stature body height, m; empty where unknown
     * @param stances what each stance showed, in the order of the recordings
     * @param summary means over the stances that give a number, and the consistency
     * @param observations what was seen, in sentences
     * @param pivots places about which the limb vaulted, mean over stances; none where the foot rolled on
     * @param locks joints that held still
     */
    public record Foot(
            Side side,
            Quantity limbLength,
            Optional<Quantity> footLength,
            Optional<Quantity> stature,
            List<Stance> stances,
            List<Value> summary,
            List<String> observations,
            List<Rolling.Pivot> pivots,
            List<Lock> locks) {

        /** Copies the lists. */
        public Foot {
            stances = List.copyOf(stances);
            summary = List.copyOf(summary);
            observations = List.copyOf(observations);
            pivots = List.copyOf(pivots);
            locks = List.copyOf(locks);
        }

        /**
         * A number of the summary.
         *
         * @param measure which
         * @return the mean, empty where no stance gives it
         */
        public Optional<Value> mean(RollOverMeasure measure) {
            return summary.stream().filter(n -> n.measure() == measure).findFirst();
        }
    }

    /**
     * One stance.
     *
     * @param trial recording
     * @param step number of the stance in it, as in the contacts table
     * @param start contact, s on the recording's clock
     * @param platforms numbers of the platforms it was on
     * @param isWhole whether the foot lay wholly on them
     * @param why what the stance may not be used for, and why; empty where it may for all
     * @param values what it gave
     * @param heelBearing whether the heel bore load by the rule; empty where not known
     * @param evidence for or against it, one sentence
     * @param posture word of the posture; empty for people
     */
    public record Stance(
            String trial,
            int step,
            double start,
            List<Integer> platforms,
            boolean isWhole,
            String why,
            List<Value> values,
            Optional<Boolean> heelBearing,
            String evidence,
            Optional<String> posture) {

        /** Copies the lists. */
        public Stance {
            platforms = List.copyOf(platforms);
            values = List.copyOf(values);
        }

        /**
         * A number of the stance.
         *
         * @param measure which
         * @return the number, empty where the stance could not give it
         */
        public Optional<Value> value(RollOverMeasure measure) {
            return values.stream().filter(n -> n.measure() == measure).findFirst();
        }
    }

    /** What a standard deviation is one of. */
    public enum Spread {
        /** Between stances. */
        BETWEEN_STANCES("between-stances"),
        /** Of the fit to one stance, neighbouring samples not counted as independent. */
        WITHIN_STANCE("within-stance");

        private final String word;

        Spread(String word) {
            this.word = word;
        }

        /**
         * The word used in files.
         *
         * @return such as {@code between-stances}
         */
        public String word() {
            return word;
        }
    }

    /**
     * One number.
     *
     * @param measure what it is
     * @param value SI, shares of stance 0 to 1, finite
     * @param sd standard deviation in the same unit; empty where unknown
     * @param spread what the standard deviation is one of
     * @param n stances behind it, 1 or more
     * @param low lower end of the 95 % interval of the mean; empty for fewer than three stances
     * @param high upper end of it
     * @param basis the weakest of what went into it
     */
    public record Value(
            RollOverMeasure measure,
            double value,
            OptionalDouble sd,
            Spread spread,
            int n,
            OptionalDouble low,
            OptionalDouble high,
            Basis basis) {

        /** Checks that the value is finite. */
        public Value {
            if (!Double.isFinite(value) || n < 1) {
                throw new IllegalArgumentException(measure.word() + " " + value + " of " + n
                        + " stances, expected a finite number of 1 stance or more");
            }
        }
    }

    /**
     * A joint that held still in stance.
     *
     * @param joint its name
     * @param lock angle and length
     */
    public record Lock(String joint, Joint.Lock lock) {}

    /**
     * A published figure.
     *
     * @param text what was found, on whom
     * @param source author and year
     */
    public record Comparison(String text, String source) {}
}
