package org.solewright.app.cli;

import java.util.EnumSet;
import java.util.Set;
import org.solewright.app.report.PageForm;
import picocli.CommandLine.Option;

/** Options of commands that write a page to be read. */
final class PageArguments {

    @Option(names = "--html", description = "Write a page for the browser too: one file, no network.")
    private boolean isHtml;

    @Option(names = "--pdf", description = "Write the page as PDF too.")
    private boolean isPdf;

    /** For picocli. */
    PageArguments() {}

    Set<PageForm> forms() {
        Set<PageForm> forms = EnumSet.noneOf(PageForm.class);
        if (isHtml) {
            forms.add(PageForm.HTML);
        }
        if (isPdf) {
            forms.add(PageForm.PDF);
        }
        return forms;
    }
}
