package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.solewright.app.pipeline.ExportUseCase;
import org.solewright.domain.finding.Cautions;

class ExportCommandTest extends DemoCalls {

    private static Called export(String template, String... more) {
        String[] args = new String[5 + more.length];
        String[] first = {"export", "--model", at("foot-model-right.xml"), "--template", template};
        System.arraycopy(first, 0, args, 0, first.length);
        System.arraycopy(more, 0, args, first.length, more.length);
        return call(args);
    }

    @ParameterizedTest
    @ValueSource(strings = {"hanim", "table", "template-kit", "urdf"})
    void demoModelGoesOutByEveryTemplate(String template) throws Exception {
        assertThat(ExportUseCase.NAMES).contains(template);
        Path file = folder.resolve("out." + template);
        Called called = export(template, "--out", file.toString());
        assertThat(called.err()).isEmpty();
        assertThat(called.code()).isZero();
        assertThat(Files.readString(file)).contains(Cautions.LINES);
        assertThat(export(template).out()).isEqualTo(Files.readString(file));
    }

    @Test
    void wrongCallsAreOneLine() throws Exception {
        assertThat(export("urfd").code()).isEqualTo(2);
        assertThat(export("urfd").errors())
                .containsExactly(
                        "solewright: --template: unknown template 'urfd': did you mean 'urdf'?, or a stylesheet's file");
        Called none = export(folder.resolve("none.xsl").toString());
        assertThat(none.code()).isEqualTo(3);
        assertThat(none.errors()).singleElement().satisfies(e -> assertThat(e).contains("no such file"));
        Called input = export("urdf", "--out", at("foot-model-right.xml"));
        assertThat(input.code()).isEqualTo(4);
        assertThat(input.errors()).singleElement().satisfies(e -> assertThat(e).contains("is an input of this call"));
        assertThat(call("export", "--model", at("landmarks.xml"), "--template", "urdf")
                        .code())
                .isEqualTo(3);
    }

    @Test
    void hostileTemplateWritesNothing() throws Exception {
        Path template = folder.resolve("mine.xsl");
        Files.writeString(
                template,
                "<xsl:stylesheet version='3.0' xmlns:xsl='http://www.w3.org/1999/XSL/Transform'><xsl:template match='/'>"
                        + "<xsl:copy-of select=\"doc('landmarks.xml')\"/></xsl:template></xsl:stylesheet>");
        Path file = folder.resolve("mine.txt");
        Called called = export(template.toString(), "--out", file.toString());
        assertThat(called.code()).isEqualTo(3);
        assertThat(called.errors())
                .containsExactly(
                        "solewright: " + template + ": the template opens 'landmarks.xml', which is not allowed:"
                                + " keep to the model and to stylesheets of the template's folder");
        assertThat(file).doesNotExist();
    }

    @Test
    void impossibleInertiaIsNotHandedOn() throws Exception {
        Path model = folder.resolve("impossible.xml");
        Files.writeString(
                model,
                Files.readString(Path.of(at("foot-model-right.xml")))
                        .replaceFirst("<inertia xx=\"[^\"]*\"", "<inertia xx=\"9.0\""));
        Called called = call("export", "--model", model.toString(), "--template", "urdf");
        assertThat(called.code()).isEqualTo(3);
        assertThat(called.out()).isEmpty();
        assertThat(called.errors())
                .singleElement()
                .satisfies(e -> assertThat(e).contains("export.inertia-impossible: shank:"));
    }
}
