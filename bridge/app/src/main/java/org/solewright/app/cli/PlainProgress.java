package org.solewright.app.cli;

import java.io.PrintWriter;
import org.solewright.app.study.StudyListener;

/** Names what did not end well, one line each. */
final class PlainProgress implements StudyListener {

    private final PrintWriter err;

    PlainProgress(PrintWriter err) {
        this.err = err;
    }

    @Override
    public void begin(String what, int tasks) {}

    @Override
    public void ended(String kind, String name, String state, String message) {
        if (!message.isEmpty()) {
            err.println(line(kind, name, state, message));
        }
    }

    /** The line that names a task which did not end well. */
    static String line(String kind, String name, String state, String message) {
        return FindingPrinter.printable("solewright: " + kind + " " + name + " " + state + ": " + message);
    }

    @Override
    public void finished() {}
}
