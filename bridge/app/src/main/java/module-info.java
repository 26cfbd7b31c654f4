/** Use cases, reports and the command line; the only module with a console. */
module org.solewright.app {
    requires transitive org.solewright.domain;
    requires org.solewright.formats;
    requires org.solewright.analysis;
    requires static transitive org.jspecify;
    requires info.picocli;
    requires com.fasterxml.jackson.databind;
    requires java.sql;
    requires org.xerial.sqlitejdbc;
    requires me.tongfei.progressbar;
    requires static java.compiler;
    requires gg.jte.runtime;
    requires openhtmltopdf.core;
    requires openhtmltopdf.pdfbox;
    requires openhtmltopdf.svg.support;
    requires org.apache.pdfbox;

    exports org.solewright.app.cli;

    opens org.solewright.app.cli to
            info.picocli;
    opens org.solewright.app.report.pages to
            gg.jte.runtime;
}
