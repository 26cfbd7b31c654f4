package org.solewright.app.report;

import com.openhtmltopdf.outputdevice.helper.BaseRendererBuilder.FSFontUseCase;
import com.openhtmltopdf.outputdevice.helper.BaseRendererBuilder.FontStyle;
import com.openhtmltopdf.pdfboxout.PdfBoxRenderer;
import com.openhtmltopdf.pdfboxout.PdfRendererBuilder;
import com.openhtmltopdf.svgsupport.BatikSVGDrawer;
import com.openhtmltopdf.util.XRLog;
import gg.jte.ContentType;
import gg.jte.TemplateEngine;
import gg.jte.output.StringOutput;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import java.util.Set;
import org.apache.pdfbox.pdmodel.PDDocument;

/** Sets pages as HTML and as PDF. The same page gives the same bytes. */
public final class PageWriter {

    private static final String TEMPLATES = "org.solewright.app.report.pages";
    private static final String FONT = "Liberation Sans";
    private static final int REGULAR = 400;
    private static final int BOLD = 700;

    private PageWriter() {}

    /**
     * One file that needs nothing else.
     *
     * @param page to be set
     * @return HTML, UTF-8
     */
    public static byte[] html(Page page) {
        return text(page, Setting.html(page.hasScene())).getBytes(StandardCharsets.UTF_8);
    }

    /**
     * The page on paper: tagged, fonts embedded.
     *
     * @param page to be set
     * @return PDF
     */
    public static byte[] pdf(Page page) {
        XRLog.setLoggingEnabled(false);
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        PdfRendererBuilder builder = new PdfRendererBuilder();
        builder.usePdfUaAccessibility(true);
        builder.useUnicodeLineBreaker(new LineBreaks());
        font(builder, "LiberationSans-Regular.ttf", REGULAR, FontStyle.NORMAL);
        font(builder, "LiberationSans-Bold.ttf", BOLD, FontStyle.NORMAL);
        font(builder, "LiberationSans-Italic.ttf", REGULAR, FontStyle.ITALIC);
        builder.withHtmlContent(text(page, Setting.pdf()), null);
        builder.withProducer("Solewright");
        try (BatikSVGDrawer drawer = new BatikSVGDrawer()) {
            builder.useSVGDrawer(drawer);
            try (PdfBoxRenderer renderer = builder.buildPdfRenderer();
                    PDDocument document = renderer.createPDFKeepOpen()) {
                TimelessPdf.save(document, out);
            }
        } catch (IOException e) {
            throw new UncheckedIOException("a page of our own cannot be set as PDF", e);
        }
        return out.toByteArray();
    }

    private static void font(PdfRendererBuilder builder, String file, int weight, FontStyle style) {
        byte[] bytes = Setting.bytes("liberation/" + file);
        builder.useFont(
                () -> new ByteArrayInputStream(bytes),
                FONT,
                weight,
                style,
                true,
                Set.of(FSFontUseCase.DOCUMENT, FSFontUseCase.SVG));
    }

    private static String text(Page page, Setting setting) {
        TemplateEngine engine =
                TemplateEngine.createPrecompiled(null, ContentType.Html, PageWriter.class.getClassLoader(), TEMPLATES);
        StringOutput output = new StringOutput();
        engine.render("page.jte", Map.of("page", page, "setting", setting), output);
        return output.toString();
    }
}
