package org.solewright.app.cli;

import picocli.CommandLine.IVersionProvider;

/** The version of this installation. */
final class Version implements IVersionProvider {

    /** The version as released. */
    static final String NUMBER = "0.1.0";

    @Override
    public String[] getVersion() {
        return new String[] {"solewright " + NUMBER};
    }
}
