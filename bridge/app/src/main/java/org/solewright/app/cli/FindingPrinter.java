package org.solewright.app.cli;

import java.io.PrintWriter;
import java.util.List;
import org.solewright.domain.finding.Finding;

/** Prints findings, one line each. */
final class FindingPrinter {

    private FindingPrinter() {}

    static void print(PrintWriter err, List<Finding> findings) {
        for (Finding f : findings) {
            err.println(printable("solewright: " + (f.where().isEmpty() ? "" : f.where() + ": ")
                    + f.severity().word() + " " + f.code() + ": " + f.message()));
        }
    }

    /** Text from files without control characters, which a terminal would obey. */
    static String printable(String text) {
        return text.replaceAll("\\p{Cntrl}", "?");
    }
}
