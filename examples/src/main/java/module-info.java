/** Programs that use Solewright as a library; each is short, and a test runs it. */
module org.solewright.examples {
    requires transitive org.solewright.formats;
    requires transitive org.solewright.analysis;
    requires static transitive org.jspecify;

    exports org.solewright.examples;
}
