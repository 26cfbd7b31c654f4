package org.solewright.app.report;

import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** A part of a section, ready to be set. */
public sealed interface Block {

    /**
     * A paragraph.
     *
     * @param text of it
     */
    record Text(String text) implements Block {}

    /**
     * A heading below that of the section.
     *
     * @param text of it
     */
    record Heading(String text) implements Block {}

    /**
     * A row of a table.
     *
     * @param head what the row is about
     * @param cells the others, empty where there is nothing
     */
    record Row(String head, List<String> cells) {

        /** Copies the list. */
        public Row {
            cells = List.copyOf(cells);
        }

        static Row of(String head, String... cells) {
            return new Row(head, List.of(cells));
        }
    }

    /**
     * A table.
     *
     * @param caption what it shows
     * @param columns heads, the first over the heads of the rows
     * @param rows in order
     * @param isOfNumbers whether all cells but the first are numbers
     */
    record Table(String caption, List<String> columns, List<Row> rows, boolean isOfNumbers) implements Block {

        /** Copies the lists and checks that all rows have one cell per column. */
        public Table {
            columns = List.copyOf(columns);
            rows = List.copyOf(rows);
            for (Row row : rows) {
                if (row.cells().size() != columns.size() - 1) {
                    throw new IllegalArgumentException("row '" + row.head() + "' of table '" + caption + "' has "
                            + (row.cells().size() + 1) + " cells, expected " + columns.size());
                }
            }
        }
    }

    /**
     * A drawing with its numbers.
     *
     * @param title what it shows
     * @param description what is to be seen in it
     * @param svg the drawing, an {@code svg} element
     * @param numbers what it is drawn from
     */
    record Figure(String title, String description, String svg, Table numbers) {

        private static final Pattern SIZE = Pattern.compile(" width=\"([0-9.]+)\" height=\"([0-9.]+)\"");

        /**
         * The drawing on paper, of a given width.
         *
         * @param millimetres width
         * @return the same with its size stated
         */
        public String svgOf(double millimetres) {
            Matcher m = SIZE.matcher(svg);
            if (!m.find()) {
                throw new IllegalStateException("drawing '" + title + "' states no size");
            }
            double ratio = Double.parseDouble(m.group(2)) / Double.parseDouble(m.group(1));
            return svg.substring(0, m.start()) + " style=\"width:" + Drawing.number(millimetres) + "mm;height:"
                    + Drawing.number(millimetres * ratio) + "mm\"" + m.group() + svg.substring(m.end());
        }
    }

    /**
     * Drawings that belong together.
     *
     * @param layout {@code one} below the other, {@code two} beside each other where there is room
     * @param figures the drawings
     */
    record Figures(String layout, List<Figure> figures) implements Block {

        /** Copies the list. */
        public Figures {
            figures = List.copyOf(figures);
        }

        /**
         * Width of its drawings on paper.
         *
         * @return mm
         */
        public double width() {
            return layout.equals("one") ? 160 : 87;
        }

        static Figures of(Figure figure) {
            return new Figures("one", List.of(figure));
        }

        static Figures beside(Figure... figures) {
            return new Figures("two", List.of(figures));
        }
    }

    /**
     * A view that can be turned and moved, with still drawings for paper and for where it cannot be drawn.
     *
     * @param title what it shows
     * @param instants number of instants that it can show, at least 1
     * @param data for the script, a JSON text
     * @param stills side, top and front
     */
    record Scene(String title, int instants, String data, List<Figure> stills) implements Block {

        /** Copies the list. */
        public Scene {
            stills = List.copyOf(stills);
        }
    }
}
