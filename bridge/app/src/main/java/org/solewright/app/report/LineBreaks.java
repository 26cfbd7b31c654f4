package org.solewright.app.report;

import com.openhtmltopdf.extend.FSTextBreaker;
import java.text.BreakIterator;
import java.util.Locale;

/** Where a line may end on paper: the language's rule, which leaves numbers whole; the library's own breaks after a full stop. */
final class LineBreaks implements FSTextBreaker {

    private final BreakIterator breaks = BreakIterator.getLineInstance(Locale.ROOT);

    @Override
    public int next() {
        return breaks.next();
    }

    @Override
    public void setText(String text) {
        breaks.setText(text);
    }
}
