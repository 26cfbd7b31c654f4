package org.solewright.app.report;

import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The library of the moving view as one plain script. It comes as two modules, which a page opened from a file may not load;
 * their exports and imports are rewritten to one object, so that one element of a page holds all.
 */
final class SceneLibrary {

    private static final Pattern EXPORT = Pattern.compile("export\\s*\\{([^}]*)\\};?");
    private static final Pattern REEXPORT =
            Pattern.compile("export\\s*\\{([^}]*)\\}\\s*from\\s*\"[^\"]*three\\.core\\.min\\.js\";?");
    private static final Pattern IMPORT =
            Pattern.compile("import\\s*\\{([^}]*)\\}\\s*from\\s*\"[^\"]*three\\.core\\.min\\.js\";?");

    private SceneLibrary() {}

    static String script() {
        String core = Setting.resource("three/three.core.min.js");
        String renderer = Setting.resource("three/three.module.min.js");
        String all = "(function(){\"use strict\";const core=(function(){" + exported(core) + "})();"
                + "const renderer=(function(){" + exported(imported(renderer)) + "})();"
                + "window.THREE=Object.assign({},core,renderer);})();";
        if (all.contains("</script")) {
            throw new IllegalStateException("the library of the moving view would end its own element");
        }
        return all;
    }

    private static String imported(String module) {
        String taken = REEXPORT.matcher(module).replaceAll("");
        Matcher m = IMPORT.matcher(taken);
        StringBuilder out = new StringBuilder();
        while (m.find()) {
            String names = m.group(1).replaceAll("([\\w$]+)\\s+as\\s+", "$1:");
            m.appendReplacement(out, Matcher.quoteReplacement("const {" + names + "}=core;"));
        }
        return m.appendTail(out).toString();
    }

    private static String exported(String module) {
        Matcher m = EXPORT.matcher(module);
        StringBuilder out = new StringBuilder();
        while (m.find()) {
            String names = m.group(1).replaceAll("([\\w$]+)\\s+as\\s+([\\w$]+)", "$2:$1");
            m.appendReplacement(out, Matcher.quoteReplacement("return {" + names + "};"));
        }
        return m.appendTail(out).toString();
    }
}
