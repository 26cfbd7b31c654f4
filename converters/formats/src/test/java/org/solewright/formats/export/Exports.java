package org.solewright.formats.export;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import org.solewright.domain.foot.FootModel;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.io.FormatException;

/** Our templates, from the source tree. */
final class Exports {

    private Exports() {}

    static Path root() {
        Path top = Path.of("").toAbsolutePath();
        while (!Files.exists(top.resolve("DEVELOPERS.md"))) {
            top = top.getParent();
        }
        return top;
    }

    static byte[] resource(String name) throws IOException {
        return Files.readAllBytes(root().resolve("templates/src/main/resources/org/solewright/templates/" + name));
    }

    static Map<String, byte[]> library() throws IOException {
        return Map.of("solewright:functions.xsl", resource("functions.xsl"));
    }

    static Exported run(String name, FootModel model) throws IOException, FormatException {
        Template template = Template.builtIn(name, resource(name + ".xsl"), library());
        return TemplateExport.run(template, model, FootModelFile.bytes(model));
    }
}
