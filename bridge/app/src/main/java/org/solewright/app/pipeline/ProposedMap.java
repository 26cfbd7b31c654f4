package org.solewright.app.pipeline;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import org.solewright.domain.gait.Side;
import org.solewright.domain.motion.ResultsMap;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.TableHead;

/**
 * A column map proposed from a table's head, for the user to correct: beside each column stands what was recognised and
 * how surely.
 */
public final class ProposedMap {

    /** Coordinates beyond this median size are millimetres: nobody is 20 m from the origin of a laboratory. */
    private static final double METRES = 20;

    private final TableHead table;
    private final List<String> names = new ArrayList<>();
    private final List<ColumnGuess> guesses = new ArrayList<>();

    private ProposedMap(TableHead table) {
        this.table = table;
        for (int c = 0; c < table.columns(); c++) {
            String name = table.header().isEmpty() ? "" : table.header().get(c);
            names.add(name);
            guesses.add(ColumnGuess.of(
                    name, table.units().isEmpty() ? "" : table.units().get(c)));
        }
    }

    /**
     * Proposes a map.
     *
     * @param file the table
     * @param beside folder in which the map will stand; empty where it goes to standard output
     * @return the map's XML text
     * @throws UseCaseException where the table cannot be opened, or nothing in it is recognised
     * @throws FormatException where it is no table
     */
    public static String of(Path file, Optional<Path> beside) throws UseCaseException, FormatException {
        TableHead table = InputFiles.read(file, TableHead::read);
        Path absolute = file.toAbsolutePath().normalize();
        Path folder = beside.orElse(Path.of("")).toAbsolutePath().normalize();
        boolean isNear = absolute.getRoot() != null && absolute.getRoot().equals(folder.getRoot());
        String name = isNear ? folder.relativize(absolute).toString().replace('\\', '/') : file.toString();
        ProposedMap map = new ProposedMap(table);
        if (map.guesses.stream().noneMatch(g -> g.quantity().isPresent())) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    file.toString(),
                    table.header().isEmpty()
                            ? "has no header, so that nothing tells what its columns are"
                            : "has no column that is recognised",
                    "write a column map by hand; see README");
        }
        return map.xml(name);
    }

    private String xml(String file) {
        StringBuilder xml = new StringBuilder("<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n");
        xml.append(
                "<!-- Proposed from the head of the table; correct it before use. sure: words of the name; likely: letters"
                        + " of\n     the name; guess: neither. Without file=\"...\" it is a template for any table of this kind. -->\n");
        xml.append("<results xmlns=\"urn:solewright:results:1\">\n");
        axes(xml);
        int time = time();
        xml.append("  <table file=\"")
                .append(text(file))
                .append("\" delimiter=\"")
                .append(delimiter());
        boolean isNumbered = table.header().isEmpty() || !table.units().isEmpty();
        // With a row of units below the header the numbers begin one line later: columns go by their numbers.
        xml.append("\" skipLines=\"").append(table.skipLines()).append('"');
        xml.append(isNumbered ? " header=\"false\"" : "");
        if (time >= 0) {
            xml.append(" timeColumn=\"").append(text(name(time, isNumbered))).append("\" timeUnit=\"");
            xml.append(timeUnit(time)).append("\">");
        } else {
            xml.append(" rate=\"100\">");
        }
        xml.append(
                time >= 0
                        ? " <!-- time: sure -->\n"
                        : " <!-- no time was recognised: state timeColumn or the rate -->\n");
        List<String> unknown = columns(xml, time, isNumbered);
        if (!unknown.isEmpty()) {
            xml.append("    <!-- not recognised, left out: ")
                    .append(comment(String.join(", ", unknown)))
                    .append(" -->\n");
        }
        return xml.append("  </table>\n</results>\n").toString();
    }

    private String delimiter() {
        return switch (table.delimiter()) {
            case '\t' -> "tab";
            case ';' -> "semicolon";
            case ' ' -> "space";
            default -> "comma";
        };
    }

    private String name(int column, boolean isNumbered) {
        return isNumbered ? Integer.toString(column + 1) : names.get(column);
    }

    private int time() {
        for (int c = 0; c < guesses.size(); c++) {
            if (guesses.get(c).isTime()) {
                return c;
            }
        }
        return -1;
    }

    private String timeUnit(int time) {
        String named = guesses.get(time).unit();
        double step = (table.at(table.rows() - 1, time) - table.at(0, time)) / (table.rows() - 1);
        return named.equals("ms") || (named.isEmpty() && step >= 0.5) ? "ms" : "s";
    }

    private List<String> columns(StringBuilder xml, int time, boolean isNumbered) {
        List<String> unknown = new ArrayList<>();
        Set<String> given = new HashSet<>();
        for (int c = 0; c < guesses.size(); c++) {
            ColumnGuess g = guesses.get(c);
            String label = names.get(c).isEmpty() ? Integer.toString(c + 1) : names.get(c);
            if (c == time) {
                continue;
            }
            Optional<ResultsMap.Quantity> quantity = g.quantity();
            boolean isRead = quantity.isPresent() && (g.axis() >= 0 || !hasAxis(quantity.get()));
            String key = isRead ? quantity.get() + "/" + g.of() + "/" + g.side() + "/" + g.axis() : "";
            if (!isRead || !given.add(key)) {
                unknown.add("'" + label + "'" + (isRead ? " (like an earlier one)" : ""));
                continue;
            }
            String unit = unit(c, quantity.get());
            xml.append("    <column name=\"").append(text(name(c, isNumbered)));
            xml.append("\" quantity=\"").append(quantity.get().word()).append('"');
            xml.append(g.of().isEmpty() ? "" : " of=\"" + g.of() + "\"");
            xml.append(g.side().map(s -> " side=\"" + s.word() + "\"").orElse(""));
            xml.append(g.axis() < 0 ? "" : " axis=\"" + "xyz".charAt(g.axis()) + "\"");
            xml.append(" unit=\"").append(unit).append("\"/> <!-- ");
            xml.append(isNumbered ? comment(label) + ": " : "")
                    .append(said(g, quantity.get(), unit))
                    .append(" -->\n");
        }
        return unknown;
    }

    private static boolean hasAxis(ResultsMap.Quantity quantity) {
        return switch (quantity) {
            case FREE_MOMENT, JOINT_POWER, JOINT_ANGLE, JOINT_MOMENT -> false;
            default -> true;
        };
    }

    private static String said(ColumnGuess g, ResultsMap.Quantity quantity, String unit) {
        String what = (g.side().map(Side::word).orElse("") + " " + g.of().replace('_', ' ')).strip();
        return quantity.word().replace('-', ' ') + (what.isEmpty() ? "" : " of " + what) + ": "
                + (g.isNamed() ? "sure" : "likely")
                + (g.unit().equals(unit) ? "" : "; unit " + unit + ": guess");
    }

    private String unit(int column, ResultsMap.Quantity quantity) {
        String named = guesses.get(column).unit();
        List<String> allowed =
                switch (quantity) {
                    case COM_POSITION, COP, POINT_POSITION ->
                        List.of(median(quantity) > METRES ? "mm" : "m", "mm", "cm", "m");
                    case COM_VELOCITY -> List.of("m/s");
                    case GROUND_FORCE -> List.of("N", "kN");
                    case FREE_MOMENT, JOINT_MOMENT -> List.of("N.m", "N.mm");
                    case JOINT_POWER -> List.of("W");
                    default -> List.of("deg", "rad");
                };
        return allowed.contains(named) ? named : allowed.get(0);
    }

    /** Median over the columns of a quantity of their greatest size. */
    private double median(ResultsMap.Quantity quantity) {
        double[] sizes = new double[guesses.size()];
        int n = 0;
        for (int c = 0; c < sizes.length; c++) {
            if (guesses.get(c).quantity().equals(Optional.of(quantity))) {
                double greatest = 0;
                for (int i = 0; i < table.rows(); i++) {
                    double v = Math.abs(table.at(i, c));
                    greatest = v > greatest ? v : greatest;
                }
                sizes[n++] = greatest;
            }
        }
        java.util.Arrays.sort(sizes, 0, n);
        return n == 0 ? 0 : sizes[n / 2];
    }

    /** Up is where the ground pushes, forward is where points travel; the third axis makes the frame right-handed. */
    private void axes(StringBuilder xml) {
        int up = strongest(ResultsMap.Quantity.GROUND_FORCE, false);
        int travelled = strongest(ResultsMap.Quantity.COM_POSITION, true);
        int forward = travelled >= 0 ? travelled : strongest(ResultsMap.Quantity.POINT_POSITION, true);
        if (up < 0 || forward < 0 || up == forward) {
            xml.append("  <axes x=\"forward\" y=\"left\" z=\"up\"/> <!-- guess: loads and travel do not tell -->\n");
            return;
        }
        String[] words = new String[3];
        double pushed = mean(ResultsMap.Quantity.GROUND_FORCE, up, false);
        double gone = travelled >= 0
                ? mean(ResultsMap.Quantity.COM_POSITION, forward, true)
                : mean(ResultsMap.Quantity.POINT_POSITION, forward, true);
        words[up] = pushed > 0 ? "up" : "down";
        words[forward] = gone > 0 ? "forward" : "backward";
        int side = 3 - up - forward;
        // forward x left = up: the sideways axis that makes a right-handed frame with the signs of the other two.
        boolean isEven = (forward + 1) % 3 == side;
        boolean isLeft = isEven == (pushed > 0 == gone > 0);
        words[side] = isLeft ? "left" : "right";
        xml.append(String.format(
                        Locale.ROOT,
                        "  <axes x=\"%s\" y=\"%s\" z=\"%s\"/> <!-- likely: %s is where the ground pushes, %s where points travel; the"
                                + " third as in a right-handed frame -->%n",
                        words[0],
                        words[1],
                        words[2],
                        "xyz".charAt(up),
                        "xyz".charAt(forward))
                .replace("\r\n", "\n"));
    }

    private int strongest(ResultsMap.Quantity quantity, boolean isTravel) {
        int best = -1;
        double most = 0;
        for (int axis = 0; axis < 3; axis++) {
            double v = Math.abs(mean(quantity, axis, isTravel));
            if (v > most) {
                most = v;
                best = axis;
            }
        }
        return best;
    }

    /** Mean value, or mean way from first to last row, over the columns of a quantity along an axis. */
    private double mean(ResultsMap.Quantity quantity, int axis, boolean isTravel) {
        double sum = 0;
        for (int c = 0; c < guesses.size(); c++) {
            ColumnGuess g = guesses.get(c);
            if (!g.quantity().equals(Optional.of(quantity)) || g.axis() != axis) {
                continue;
            }
            double first = Double.NaN;
            double last = Double.NaN;
            double total = 0;
            for (int i = 0; i < table.rows(); i++) {
                double v = table.at(i, c);
                if (!Double.isNaN(v)) {
                    first = Double.isNaN(first) ? v : first;
                    last = v;
                    total += v;
                }
            }
            double value = isTravel ? last - first : total;
            sum += Double.isNaN(value) ? 0 : value;
        }
        return sum;
    }

    private static String text(String s) {
        return s.replace("&", "&amp;").replace("<", "&lt;").replace("\"", "&quot;");
    }

    /** Two hyphens end a comment, and so may the last one. */
    private static String comment(String s) {
        return s.replaceAll("-(?=-)", "- ").replaceAll("-$", "- ");
    }
}
