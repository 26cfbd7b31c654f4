package org.solewright.app.report;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.util.Calendar;
import java.util.GregorianCalendar;
import java.util.Locale;
import java.util.TimeZone;
import java.util.regex.Pattern;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.common.PDMetadata;

/** Saves a PDF without the clock: its times are a fixed one and its identifier follows from its content. */
final class TimelessPdf {

    private static final Pattern TIME =
            Pattern.compile("\\d{4}-\\d{2}-\\d{2}T\\d{2}:\\d{2}:\\d{2}(?:\\.\\d+)?(?:[+-]\\d{2}:\\d{2}|Z)?");
    private static final String FIXED = "2000-01-01T00:00:00Z";
    private static final int YEAR = 2000;

    private TimelessPdf() {}

    static void save(PDDocument document, OutputStream out) throws IOException {
        Calendar time = new GregorianCalendar(TimeZone.getTimeZone("UTC"), Locale.ROOT);
        time.clear();
        time.set(YEAR, Calendar.JANUARY, 1);
        document.getDocumentInformation().setCreationDate(time);
        document.getDocumentInformation().setModificationDate(time);
        document.setDocumentId(1L);
        PDMetadata metadata = document.getDocumentCatalog().getMetadata();
        if (metadata != null) {
            String text = new String(metadata.toByteArray(), StandardCharsets.UTF_8);
            metadata.importXMPMetadata(TIME.matcher(text).replaceAll(FIXED).getBytes(StandardCharsets.UTF_8));
        }
        document.save(out);
    }
}
