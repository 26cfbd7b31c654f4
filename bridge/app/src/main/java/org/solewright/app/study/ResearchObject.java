package org.solewright.app.study;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.solewright.domain.finding.Cautions;
import org.solewright.formats.io.AtomicOutput;

/**
 * The study's metadata as an RO-Crate 1.1 [Soiland-Reyes 2022]: one JSON-LD file beside it that names settings, tables,
 * models and summaries with their digests. The day of publication is the one that the settings state, as results bear no
 * clock time.
 */
final class ResearchObject {

    static final String NAME = "ro-crate-metadata.json";

    private ResearchObject() {}

    static Path write(Study study, String version, List<Path> tables, List<Outcome.Output> results) throws IOException {
        Path file = study.folder().resolve(NAME);
        List<Outcome.Output> parts = new ArrayList<>();
        List<Path> own = new ArrayList<>(List.of(
                study.folder().resolve(Study.SETTINGS),
                study.folder().resolve(Study.SUBJECTS),
                study.folder().resolve(Study.TRIALS)));
        own.addAll(tables);
        for (Path p : own) {
            parts.add(new Outcome.Output(
                    study.folder().relativize(p).toString().replace('\\', '/'), Digests.sha256(p), Files.size(p)));
        }
        parts.addAll(results);
        AtomicOutput.write(file, out -> write(out, study, version, parts));
        return file;
    }

    private static void write(OutputStream out, Study study, String version, List<Outcome.Output> parts)
            throws IOException {
        // Closing the generator must not close the caller's stream before it is flushed by the caller.
        try (JsonGenerator json = new JsonFactory()
                .createGenerator(out)
                .disable(JsonGenerator.Feature.AUTO_CLOSE_TARGET)
                .setPrettyPrinter(new DefaultPrettyPrinter()
                        .withObjectIndenter(new DefaultIndenter("  ", "\n"))
                        .withArrayIndenter(new DefaultIndenter("  ", "\n")))) {
            json.writeStartObject();
            json.writeStringField("@context", "https://w3id.org/ro/crate/1.1/context");
            json.writeArrayFieldStart("@graph");
            json.writeStartObject();
            json.writeStringField("@id", NAME);
            json.writeStringField("@type", "CreativeWork");
            reference(json, "conformsTo", "https://w3id.org/ro/crate/1.1");
            reference(json, "about", "./");
            json.writeEndObject();
            root(json, study, parts);
            json.writeStartObject();
            json.writeStringField("@id", "#solewright");
            json.writeStringField("@type", "SoftwareApplication");
            json.writeStringField("name", "Solewright");
            json.writeStringField("version", version);
            json.writeEndObject();
            action(json, parts);
            for (Outcome.Output part : parts) {
                part(json, part);
            }
            json.writeEndArray();
            json.writeEndObject();
        }
        out.write('\n');
    }

    private static void root(JsonGenerator json, Study study, List<Outcome.Output> parts) throws IOException {
        json.writeStartObject();
        json.writeStringField("@id", "./");
        json.writeStringField("@type", "Dataset");
        json.writeStringField("name", study.settings().name());
        json.writeStringField(
                "description",
                "Segmented foot models and posture costs of " + study.subjects().size() + " subjects in "
                        + study.trials().size() + " trials. " + String.join(" ", Cautions.LINES));
        if (!study.settings().date().isEmpty()) {
            json.writeStringField("datePublished", study.settings().date());
        }
        references(json, "hasPart", parts);
        reference(json, "mentions", "#run");
        json.writeEndObject();
    }

    private static void action(JsonGenerator json, List<Outcome.Output> parts) throws IOException {
        json.writeStartObject();
        json.writeStringField("@id", "#run");
        json.writeStringField("@type", "CreateAction");
        json.writeStringField("name", "study");
        reference(json, "instrument", "#solewright");
        references(json, "object", parts.stream().filter(p -> isInput(p.file())).toList());
        references(
                json, "result", parts.stream().filter(p -> !isInput(p.file())).toList());
        json.writeEndObject();
    }

    private static boolean isInput(String file) {
        return List.of(Study.SETTINGS, Study.SUBJECTS, Study.TRIALS).contains(file);
    }

    private static void part(JsonGenerator json, Outcome.Output part) throws IOException {
        json.writeStartObject();
        json.writeStringField("@id", reference(part.file()));
        json.writeStringField("@type", "File");
        json.writeStringField("name", part.file());
        json.writeStringField("encodingFormat", part.file().endsWith(".csv") ? "text/csv" : "application/xml");
        json.writeNumberField("contentSize", part.bytes());
        json.writeStringField("sha256", part.sha256());
        json.writeEndObject();
    }

    private static void reference(JsonGenerator json, String field, String id) throws IOException {
        json.writeObjectFieldStart(field);
        json.writeStringField("@id", id);
        json.writeEndObject();
    }

    private static void references(JsonGenerator json, String field, List<Outcome.Output> parts) throws IOException {
        json.writeArrayFieldStart(field);
        for (Outcome.Output part : parts) {
            json.writeStartObject();
            json.writeStringField("@id", reference(part.file()));
            json.writeEndObject();
        }
        json.writeEndArray();
    }

    /** A relative reference: letters that an URI does not hold are escaped. */
    private static String reference(String file) {
        StringBuilder out = new StringBuilder();
        for (byte b : file.getBytes(StandardCharsets.UTF_8)) {
            char c = (char) (b & 0xff);
            if (c < 128 && (Character.isLetterOrDigit(c) || "-._~/+".indexOf(c) >= 0)) {
                out.append(c);
            } else {
                out.append(String.format(java.util.Locale.ROOT, "%%%02X", b & 0xff));
            }
        }
        return out.toString();
    }
}
