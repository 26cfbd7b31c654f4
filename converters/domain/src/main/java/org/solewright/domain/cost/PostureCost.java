package org.solewright.domain.cost;

import java.util.List;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.SourceFile;

/**
 * The posture-cost summary of an appraisal with all that is needed to repeat it.
 *
 * @param version version of the tool that made it
 * @param sources inputs, in the order of their use
 * @param settings options and defaults that shaped the result, in a fixed order
 * @param rows transitions and summary rows, in the order they are printed
 * @param findings what has to be said about it
 * @param cautions sentences every reader must see
 */
public record PostureCost(
        String version,
        List<SourceFile> sources,
        List<Setting> settings,
        List<TransitionRow> rows,
        List<Finding> findings,
        List<String> cautions) {

    /**
     * An option or default that shaped the result.
     *
     * @param name such as {@code contact threshold}
     * @param value with its unit
     * @param basis {@code given} by the user or {@code default}
     */
    public record Setting(String name, String value, String basis) {

        /** Checks that the name says something and the basis is one of the two words. */
        public Setting {
            if (name.isBlank() || !(basis.equals("given") || basis.equals("default"))) {
                throw new IllegalArgumentException(
                        "setting '" + name + "' of basis '" + basis + "', expected given or default");
            }
        }
    }

    /** Copies the lists. */
    public PostureCost {
        sources = List.copyOf(sources);
        settings = List.copyOf(settings);
        rows = List.copyOf(rows);
        findings = List.copyOf(findings);
        cautions = List.copyOf(cautions);
    }
}
