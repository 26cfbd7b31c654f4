package org.solewright.app.pipeline;

import java.io.IOException;
import java.io.InputStreamReader;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Objects;
import java.util.Optional;
import java.util.Properties;

/** What a user can do about a finding, by its code. */
public final class FindingCures {

    private static final String RESOURCE = "finding-cures.properties";

    private final Properties cures = new Properties();

    private FindingCures() {}

    /**
     * The cures that come with the tool.
     *
     * @return a cure for every code
     */
    public static FindingCures read() {
        FindingCures all = new FindingCures();
        try (Reader in = new InputStreamReader(
                Objects.requireNonNull(FindingCures.class.getResourceAsStream(RESOURCE), RESOURCE),
                StandardCharsets.UTF_8)) {
            all.cures.load(in);
        } catch (IOException e) {
            throw new UncheckedIOException("a resource of our own cannot be read", e);
        }
        return all;
    }

    /**
     * What to do about a finding.
     *
     * @param code of the finding
     * @return one sentence; empty for an unknown code
     */
    public Optional<String> of(String code) {
        return Optional.ofNullable(cures.getProperty(code));
    }
}
