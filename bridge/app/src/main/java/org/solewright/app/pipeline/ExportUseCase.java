package org.solewright.app.pipeline;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Severity;
import org.solewright.domain.foot.FootModel;
import org.solewright.formats.export.Exported;
import org.solewright.formats.export.Template;
import org.solewright.formats.export.TemplateExport;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.io.Spelling;

/** A foot model in another format, by one of our templates or the user's own. */
public final class ExportUseCase {

    /** Our templates. */
    public static final List<String> NAMES = List.of("hanim", "table", "template-kit", "urdf");

    private static final String FOLDER = "org/solewright/templates/";
    private static final String FUNCTIONS = "functions.xsl";

    private ExportUseCase() {}

    /**
     * Exports a model.
     *
     * @param model the foot model's file
     * @param template a name of {@link #NAMES} or a stylesheet's file; a name goes before a file of that name
     * @param out target, which must not be an input; empty where the bytes are only returned
     * @return output and findings, none of them an error
     * @throws UseCaseException where a file cannot be read or written, or model or output cannot be
     * @throws FormatException where model or template is not in order, or the template does what it may not
     */
    public static Exported run(Path model, String template, Optional<Path> out)
            throws UseCaseException, FormatException {
        Template stylesheet = template(template);
        if (out.isPresent()) {
            checkNoInput(out.get(), model, template);
        }
        FootModel foot = InputFiles.read(model, FootModelFile::read);
        // The file's own bytes, past its schema: writing them anew would take as long as the template.
        Exported exported = TemplateExport.run(stylesheet, foot, InputFiles.read(model, Files::readAllBytes));
        for (Finding f : exported.findings()) {
            if (f.severity() == Severity.ERROR) {
                throw new UseCaseException(
                        UseCaseException.Kind.INPUT,
                        model.toString(),
                        f.code() + ": " + f.where() + ": " + f.message(),
                        FindingCures.read().of(f.code()).orElse("correct the model or the template"));
            }
        }
        if (out.isPresent()) {
            ResultText.write(out.get(), exported.content());
        }
        return exported;
    }

    private static Template template(String name) throws UseCaseException, FormatException {
        Map<String, byte[]> library = Map.of("solewright:" + FUNCTIONS, resource(FUNCTIONS));
        if (NAMES.contains(name)) {
            return Template.builtIn(name, resource(name + ".xsl"), library);
        }
        Path file = Path.of(name);
        if (!name.contains(".") && !Files.exists(file)) {
            throw new UseCaseException(
                    UseCaseException.Kind.USAGE,
                    "--template",
                    "unknown template '" + name + "'",
                    Spelling.hint(name, NAMES) + ", or a stylesheet's file");
        }
        return InputFiles.read(file, f -> Template.read(f, library));
    }

    private static void checkNoInput(Path out, Path model, String template) throws UseCaseException {
        List<Path> inputs = NAMES.contains(template) ? List.of(model) : List.of(model, Path.of(template));
        for (Path input : inputs) {
            try {
                if (Files.exists(out) && Files.exists(input) && Files.isSameFile(out, input)) {
                    throw new UseCaseException(
                            UseCaseException.Kind.OUTPUT,
                            out.toString(),
                            "is an input of this call and would be replaced",
                            "give another --out");
                }
            } catch (IOException e) {
                throw new UseCaseException(
                        UseCaseException.Kind.OUTPUT,
                        out.toString(),
                        "cannot be compared with the inputs (" + e.getMessage() + ")",
                        "give another --out",
                        e);
            }
        }
    }

    private static byte[] resource(String name) {
        try (InputStream in = ExportUseCase.class.getClassLoader().getResourceAsStream(FOLDER + name)) {
            if (in == null) {
                throw new IllegalStateException("template " + name + " is missing from this build");
            }
            return in.readAllBytes();
        } catch (IOException e) {
            throw new IllegalStateException("template " + name + " of this build cannot be read", e);
        }
    }
}
