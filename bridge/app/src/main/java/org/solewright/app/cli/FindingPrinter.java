package org.solewright.app.cli;

import java.io.PrintWriter;
import java.util.List;
import org.solewright.domain.finding.Finding;

/** Prints findings, one line each. */
final class FindingPrinter {

    private FindingPrinter() {}

    static void print(PrintWriter err, List<Finding> findings) {
        for (Finding f : findings) {
            err.println("solewright: " + (f.where().isEmpty() ? "" : f.where() + ": ")
                    + f.severity().word() + " " + f.code() + ": " + f.message());
        }
    }
}
