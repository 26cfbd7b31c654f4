package org.solewright.app.cli;

import java.util.Optional;
import picocli.CommandLine.Option;

/** Options that name a part of a recording and how its flags are read. */
final class WindowArguments {

    @Option(
            names = "--from",
            paramLabel = "PLACE",
            description = "First frame: a frame number, a time such as 1.25s, or an event such as 'Right Foot Strike'.")
    private Optional<String> from = Optional.empty();

    @Option(names = "--to", paramLabel = "PLACE", description = "Last frame, as --from.")
    private Optional<String> to = Optional.empty();

    @Option(names = "--ignore-flags", description = "Take samples for seen that the file flags as missing.")
    private boolean isFlagIgnored;

    /** For picocli. */
    WindowArguments() {}

    Optional<String> from() {
        return from;
    }

    Optional<String> to() {
        return to;
    }

    boolean isFlagIgnored() {
        return isFlagIgnored;
    }
}
