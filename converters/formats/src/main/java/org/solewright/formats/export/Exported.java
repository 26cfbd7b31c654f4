package org.solewright.formats.export;

import java.util.List;
import org.solewright.domain.finding.Finding;

/** What a template wrote. */
public final class Exported {

    private final byte[] content;
    private final List<Finding> findings;

    Exported(byte[] content, List<Finding> findings) {
        this.content = content.clone();
        this.findings = List.copyOf(findings);
    }

    /**
     * The output.
     *
     * @return all bytes
     */
    public byte[] content() {
        return content.clone();
    }

    /**
     * What the template said, and what is wrong with its output.
     *
     * @return errors where the output must not be used
     */
    public List<Finding> findings() {
        return findings;
    }
}
