/**
 * Files and what they mean: C3D, models, tables, exports. Everything comes out in SI units of the domain; units are converted
 * here and nowhere else. No mathematics beyond the formats' own rules, no console.
 */
module org.solewright.formats {
    requires transitive org.solewright.domain;
    requires static transitive org.jspecify;
    requires jakarta.xml.bind;
    requires transitive java.xml;
    requires de.siegmar.fastcsv;
    requires Saxon.HE;

    exports org.solewright.formats.c3d;
    exports org.solewright.formats.export;
    exports org.solewright.formats.footmodel;
    exports org.solewright.formats.io;
    exports org.solewright.formats.table;

    opens org.solewright.formats.footmodel.costxml to
            jakarta.xml.bind;
    opens org.solewright.formats.footmodel.footxml to
            jakarta.xml.bind;
    opens org.solewright.formats.footmodel.planxml to
            jakarta.xml.bind;
    opens org.solewright.formats.footmodel.landmarksxml to
            jakarta.xml.bind;
    opens org.solewright.formats.footmodel.resultsxml to
            jakarta.xml.bind;
    opens org.solewright.formats.footmodel.rolloverxml to
            jakarta.xml.bind;
    opens org.solewright.formats.footmodel.studyxml to
            jakarta.xml.bind;
}
