package org.solewright.app.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import javax.xml.parsers.DocumentBuilderFactory;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.cos.COSName;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.font.PDFont;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.solewright.domain.finding.Cautions;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

/** Pages of the demo: complete, closed to the network, readable without colour, the same bytes twice. */
class PagesTest extends DemoCalls {

    private static final String MINUS = "\u2212";

    private static String page(String name) throws IOException {
        return Files.readString(demo.resolve(name));
    }

    private static Document document(String name) throws Exception {
        String text = page(name).replaceAll("(?s)<script[^>]*>.*?</script>", "").replace("<!DOCTYPE html>", "");
        DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
        factory.setFeature("http://apache.org/xml/features/disallow-doctype-decl", true);
        return factory.newDocumentBuilder().parse(new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8)));
    }

    @ParameterizedTest
    @ValueSource(strings = {"posture-cost.html", "foot-model-right.html", "foot-model-left.html"})
    void pagesAreOneFileThatLoadsNothing(String name) throws Exception {
        String text = page(name);
        assertThat(text.startsWith("<!DOCTYPE html>\n<html lang=\"en\">")).isTrue();
        Element policy = (Element) document(name).getElementsByTagName("meta").item(1);
        assertThat(policy.getAttribute("content"))
                .startsWith("default-src 'none'; style-src 'sha256-")
                .doesNotContain("unsafe");
        String own = text.replaceAll("(?s)<script[^>]*>.*?</script>", "");
        // The only address is the name space of drawings, which is a name and no place.
        String names = own.replace("http://www.w3.org/2000/svg", "");
        for (String sign : List.of("http:", "https:", "url(", "@import", "style=\"", "onclick", "javascript:")) {
            assertThat(names.contains(sign)).as(sign).isFalse();
        }
        assertThat(own.length())
                .as("bytes without the library of the moving view")
                .isLessThan(300_000);
    }

    @ParameterizedTest
    @ValueSource(strings = {"posture-cost.html", "foot-model-right.html", "foot-model-left.html"})
    void pagesAreWellFormedWithHeadingsInOrder(String name) throws Exception {
        Document document = document(name);
        NodeList all = document.getElementsByTagName("*");
        int depth = 0;
        for (int i = 0; i < all.getLength(); i++) {
            String tag = all.item(i).getNodeName();
            if (tag.matches("h[1-6]")) {
                int level = tag.charAt(1) - '0';
                assertThat(level).as(all.item(i).getTextContent()).isLessThanOrEqualTo(depth + 1);
                depth = level;
            }
        }
        assertThat(document.getElementsByTagName("h1").getLength()).isEqualTo(1);
        List<String> ids = new java.util.ArrayList<>();
        for (int i = 0; i < all.getLength(); i++) {
            String id = ((Element) all.item(i)).getAttribute("id");
            if (!id.isEmpty()) {
                ids.add(id);
            }
        }
        assertThat(ids).doesNotHaveDuplicates();
    }

    @ParameterizedTest
    @ValueSource(strings = {"posture-cost.html", "foot-model-right.html"})
    void tablesHaveCaptionsAndScopesAndFiguresHaveWordsAndNumbers(String name) throws Exception {
        Document document = document(name);
        NodeList tables = document.getElementsByTagName("table");
        assertThat(tables.getLength()).isGreaterThan(4);
        for (int i = 0; i < tables.getLength(); i++) {
            Element table = (Element) tables.item(i);
            assertThat(table.getElementsByTagName("caption").getLength()).isEqualTo(1);
            NodeList heads = table.getElementsByTagName("th");
            for (int k = 0; k < heads.getLength(); k++) {
                assertThat(((Element) heads.item(k)).getAttribute("scope")).isIn("row", "col");
            }
        }
        NodeList figures = document.getElementsByTagName("figure");
        assertThat(figures.getLength()).isGreaterThanOrEqualTo(3);
        for (int i = 0; i < figures.getLength(); i++) {
            Element figure = (Element) figures.item(i);
            assertThat(figure.getElementsByTagName("title").item(0).getTextContent())
                    .isNotBlank();
            assertThat(figure.getElementsByTagName("desc").item(0).getTextContent())
                    .isNotBlank();
            assertThat(figure.getElementsByTagName("table").getLength()).isEqualTo(1);
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"posture-cost.html", "foot-model-right.html", "foot-model-left.html"})
    void qualityComesFirstAndFindingsAndCautionsAreThere(String name) throws Exception {
        String text = page(name);
        assertThat(text.indexOf("Recording quality first"))
                .isPositive()
                .isLessThan(text.indexOf("<h2>Findings</h2>"))
                .isLessThan(text.indexOf("<figure"));
        assertThat(text).contains("mass not given, measured by the platforms", "mass.not-given");
        Cautions.LINES.forEach(line -> assertThat(text).contains(line));
    }

    @Test
    void negativeNumbersHaveMinusSigns() throws Exception {
        String text = document("posture-cost.html")
                .getElementsByTagName("main")
                .item(0)
                .getTextContent();
        assertThat(text).contains(MINUS);
        assertThat(Pattern.compile("(?<![\\w.-])-\\d").matcher(text).find()).isFalse();
    }

    @Test
    void textKeepsItsContrast() throws Exception {
        // Every colour of text against white, by the formula of relative luminance of WCAG 2.
        Matcher m = Pattern.compile("(?:color|fill)[:=]\"?(#[0-9a-f]{6})").matcher(page("posture-cost.html"));
        int n = 0;
        while (m.find()) {
            if (!m.group(1).equals("#ffffff") && !m.group(1).equals("#f0f3f4")) {
                n++;
                assertThat(1.05 / (luminance(m.group(1)) + 0.05)).as(m.group(1)).isGreaterThanOrEqualTo(4.5);
            }
        }
        assertThat(n).isGreaterThan(20);
    }

    private static double luminance(String colour) {
        double[] weights = {0.2126, 0.7152, 0.0722};
        double sum = 0;
        for (int i = 0; i < 3; i++) {
            double c = Integer.parseInt(colour.substring(1 + 2 * i, 3 + 2 * i), 16) / 255.0;
            sum += weights[i] * (c <= 0.04045 ? c / 12.92 : Math.pow((c + 0.055) / 1.055, 2.4));
        }
        return sum;
    }

    @Test
    void sameInputGivesTheSameBytes() throws IOException {
        Path out = folder.resolve("again");
        Called called = call(
                "appraise",
                "--model",
                at("foot-model-right.xml"),
                "--model",
                at("foot-model-left.xml"),
                "--walking",
                at("walking-1.c3d"),
                "--walking",
                at("walking-2.c3d"),
                "--landmarks",
                at("landmarks.xml"),
                "--html",
                "--pdf",
                "--out",
                out.toString());
        assertThat(called.code()).as(called.err()).isZero();
        byte[] html = Files.readAllBytes(out.resolve("posture-cost.html"));
        byte[] pdf = Files.readAllBytes(out.resolve("posture-cost.pdf"));
        call(
                "appraise",
                "--model",
                at("foot-model-right.xml"),
                "--model",
                at("foot-model-left.xml"),
                "--walking",
                at("walking-1.c3d"),
                "--walking",
                at("walking-2.c3d"),
                "--landmarks",
                at("landmarks.xml"),
                "--html",
                "--pdf",
                "--out",
                out.toString());
        // Compared without printing what differs, which would be pages.
        assertThat(Arrays.equals(Files.readAllBytes(out.resolve("posture-cost.html")), html))
                .isTrue();
        assertThat(Arrays.equals(Files.readAllBytes(out.resolve("posture-cost.pdf")), pdf))
                .isTrue();
    }

    @Test
    void paperIsTaggedAndHasItsFonts() throws IOException {
        try (PDDocument pdf = Loader.loadPDF(demo.resolve("posture-cost.pdf").toFile())) {
            assertThat(pdf.getDocumentCatalog().getMarkInfo().isMarked()).isTrue();
            assertThat(pdf.getDocumentCatalog().getStructureTreeRoot()).isNotNull();
            assertThat(pdf.getDocumentCatalog().getLanguage()).startsWith("en");
            for (PDPage page : pdf.getPages()) {
                for (COSName font : page.getResources().getFontNames()) {
                    PDFont used = page.getResources().getFont(font);
                    assertThat(used.isEmbedded()).as(used.getName()).isTrue();
                    assertThat(used.getName()).contains("LiberationSans");
                }
            }
            String text = new PDFTextStripper().getText(pdf);
            assertThat(text.contains(MINUS)).isTrue();
            assertThat(text.contains("Not a medical device")).isTrue();
            assertThat(Pattern.compile("(?<![\\w.-])-\\d").matcher(text).find()).isFalse();
        }
    }

    @Test
    void pagesAreWrittenOnlyWhenAsked() {
        Called called = fit("--out", folder.resolve("plain").toString());
        assertThat(called.code()).as(called.err()).isZero();
        assertThat(folder.resolve("plain").resolve("foot-model-right.xml")).exists();
        assertThat(folder.resolve("plain").resolve("foot-model-right.html")).doesNotExist();
    }
}
