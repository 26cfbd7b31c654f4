package org.solewright.formats.export;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.gait.Side;
import org.solewright.formats.footmodel.FootModelFile;
import org.solewright.formats.io.FormatException;

/** What a template must not do is refused in one line, whatever it does about errors. */
class HostileTemplateTest {

    private static final FootModel MODEL =
            InventedFoot.of(Side.LEFT, InventedFoot.INERTIA, SegmentName.SHANK, SegmentName.FOOT);

    @TempDir
    Path folder;

    private static String stylesheet(String top, String body) {
        return "<xsl:stylesheet version='3.0' xmlns:xsl='http://www.w3.org/1999/XSL/Transform'"
                + " xmlns:xs='http://www.w3.org/2001/XMLSchema' xmlns:f='urn:f' xmlns:r='java:java.lang.Runtime'>"
                + "<xsl:output method='text'/>" + top + "<xsl:template match='/'>" + body
                + "</xsl:template></xsl:stylesheet>";
    }

    private Exported run(String text) throws IOException, FormatException {
        Path file = Files.createDirectories(folder.resolve("own")).resolve("mine.xsl");
        Files.writeString(file, text);
        return TemplateExport.run(
                Template.read(file, Exports.library()), MODEL, FootModelFile.bytes(MODEL), Duration.ofSeconds(3));
    }

    private FormatException refused(String text) {
        FormatException e = catchThrowableOfType(FormatException.class, () -> run(text));
        assertThat(e).isNotNull();
        assertThat(e.source()).endsWith("mine.xsl");
        assertThat(e.getMessage() + e.whatToDo()).doesNotContain("\n");
        assertThat(e.whatToDo()).isNotEmpty();
        return e;
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "document('/etc/hostname')",
                "doc('/etc/hostname')",
                "doc('../secret.xml')",
                "doc('http://127.0.0.1:9/x.xml')",
                "doc('secret.xml')",
                "doc-available('file:///etc/passwd')",
                "unparsed-text('/etc/hostname')",
                "unparsed-text-available('file:///etc/hostname')",
                "unparsed-text-lines('/etc/hostname')",
                "json-doc('/etc/x.json')",
                "collection('file:///etc')",
                "uri-collection('file:///etc')",
                "transform(map{'stylesheet-location': 'file:///etc/x.xsl', 'source-node': /})?output"
            })
    void opensNothing(String expression) throws IOException {
        Files.createDirectories(folder.resolve("own"));
        Files.writeString(folder.resolve("own/secret.xml"), "<a/>");
        Files.writeString(folder.resolve("secret.xml"), "<a/>");
        FormatException e = refused(stylesheet("", "<xsl:value-of select=\"" + expression + "\"/>"));
        assertThat(e.getMessage()).matches("the template (opens|includes) .*which is not allowed");
        FormatException caught = refused(stylesheet(
                "", "<xsl:try><xsl:value-of select=\"" + expression + "\"/><xsl:catch>none</xsl:catch></xsl:try>"));
        assertThat(caught.getMessage()).isEqualTo(e.getMessage());
    }

    @Test
    void writesNoFile() {
        Path target = folder.resolve("written.txt");
        FormatException e = refused(stylesheet(
                "", "<xsl:result-document href='" + target.toUri() + "' method='text'>x</xsl:result-document>"));
        assertThat(e.getMessage()).contains("writes a second document");
        assertThat(target).doesNotExist();
    }

    @ParameterizedTest
    @CsvSource({
        "../outside.xsl, from outside its folder",
        "file:///etc/x.xsl, from outside its folder",
        "http://127.0.0.1:9/x.xsl, from outside its folder",
        "link.xsl, from outside its folder",
        "missing.xsl, has no such file",
        "solewright:none.xsl, from outside its folder"
    })
    void includesNothingFromOutsideItsFolder(String href, String what) throws IOException {
        Files.createDirectories(folder.resolve("own"));
        Path outside = folder.resolve("outside.xsl");
        Files.writeString(outside, stylesheet("", "outside"));
        Files.createSymbolicLink(folder.resolve("own/link.xsl"), outside);
        assertThat(refused(stylesheet("<xsl:include href='" + href + "'/>", "x"))
                        .getMessage())
                .contains("includes '" + href + "'")
                .contains(what);
    }

    @Test
    void includesFilesOfItsFolderAndOurFunctions() throws IOException, FormatException {
        Files.createDirectories(folder.resolve("own/parts"));
        Files.writeString(
                folder.resolve("own/parts/a.xsl"),
                "<xsl:stylesheet version='3.0' xmlns:xsl='http://www.w3.org/1999/XSL/Transform'>"
                        + "<xsl:variable name='word' select=\"'here'\"/></xsl:stylesheet>");
        Exported e = run(stylesheet(
                "<xsl:import href='parts/a.xsl'/><xsl:import href='solewright:functions.xsl'/>",
                "<xsl:value-of select=\"$word, current-dateTime(), static-base-uri(), base-uri(/),"
                        + " available-environment-variables(), system-property('user.home')\"/>"));
        // Same bytes for the same input: no clock, no place, no environment.
        assertThat(new String(e.content(), StandardCharsets.UTF_8))
                .startsWith("here 1970-01-01T00:00:00")
                .contains("template:/template.xsl model:/model.xml")
                .doesNotContain(folder.toString())
                .doesNotContain(System.getProperty("user.home"));
    }

    @Test
    void callsNoFunctionOfJava() {
        assertThat(refused(stylesheet("", "<xsl:value-of select='r:exec(r:getRuntime(), \"id\")'/>"))
                        .getMessage())
                .contains("line 1")
                .contains("getRuntime");
        assertThat(refused(stylesheet("", "<xsl:evaluate xpath='\"1\"'/>")).getMessage())
                .contains("evaluate");
    }

    @Test
    void endlessTemplatesEnd() {
        String deep =
                "<xsl:function name='f:a'><xsl:param name='n'/><xsl:sequence select='1 + f:a($n + 1)'/></xsl:function>";
        assertThat(refused(stylesheet(deep, "<xsl:value-of select='f:a(1)'/>")).getMessage())
                .isEqualTo("the template calls itself too deep");
        String loop =
                "<xsl:function name='f:a'><xsl:param name='n'/><xsl:sequence select='if ($n lt 0) then 1 else f:a($n + 1)'/></xsl:function>";
        assertThat(refused(stylesheet(loop, "<xsl:value-of select='f:a(1)'/>")).getMessage())
                .isEqualTo("the template ran longer than 3 s");
        assertThat(refused(stylesheet("", "<xsl:for-each select='1 to 100000000'>0123456789</xsl:for-each>"))
                        .getMessage())
                .satisfiesAnyOf(
                        m -> assertThat(m).contains("writes more than 67108864 bytes"),
                        m -> assertThat(m).contains("ran longer"));
    }

    @Test
    void entitiesOfATemplateAreRefused() {
        assertThat(refused("<!DOCTYPE x [<!ENTITY e SYSTEM 'file:///etc/passwd'>]>" + stylesheet("", "&e;"))
                        .getMessage())
                .contains("DOCTYPE");
    }

    @Test
    void whatATemplateSaysIsHeard() throws IOException, FormatException {
        Exported e = run(stylesheet("", "<xsl:message>no\n rolling</xsl:message>x"));
        assertThat(e.findings()).singleElement().satisfies(f -> {
            assertThat(f.code()).isEqualTo("export.template-message");
            assertThat(f.message()).isEqualTo("no rolling");
        });
        assertThat(refused(stylesheet("", "<xsl:message terminate='yes'>no pads</xsl:message>"))
                        .getMessage())
                .isEqualTo("the template stopped with 'no pads'");
        assertThat(refused("no xml").getMessage()).contains("line 1");
        assertThat(refused(stylesheet("", "<xsl:value-of select='1 +'/>")).getMessage())
                .contains("line 1");
    }
}
