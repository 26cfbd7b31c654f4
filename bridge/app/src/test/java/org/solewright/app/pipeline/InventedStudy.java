package org.solewright.app.pipeline;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import org.solewright.formats.c3d.C3dWriter;
import org.solewright.formats.footmodel.LandmarkMapFile;

/**
 * Writes a study of invented subjects, each with a standing trial and some walks at speeds and step lengths of its own.
 * Also a program: {@code InventedStudy DIR SUBJECTS WALKS}, for the long runs of DEVELOPERS.md.
 */
public final class InventedStudy {

    private InventedStudy() {}

    /**
     * Writes recordings and landmark map, a folder per subject, without the three files of the study.
     *
     * @param folder made where it is missing
     * @param subjects how many
     * @param walks of each
     * @throws IOException where it cannot be written
     */
    public static void write(Path folder, int subjects, int walks) throws IOException {
        Files.createDirectories(folder);
        LandmarkMapFile.write(folder.resolve("landmarks.xml"), DemoStudy.map());
        for (int s = 1; s <= subjects; s++) {
            Path of = Files.createDirectories(folder.resolve(String.format(Locale.ROOT, "P%03d", s)));
            C3dWriter.write(
                    of.resolve("standing.c3d"),
                    DemoStudy.WALKS
                            .get(0)
                            .recorder()
                            .standing("standing.c3d", DemoStudy.STANDING_FRAMES, DemoStudy.points(true)));
            for (int w = 1; w <= walks; w++) {
                String name = "walking-" + w;
                // Steps of 0.50 to 0.62 m at like speeds, none twice.
                double share = (double) ((s - 1) * walks + w - 1) / (subjects * walks);
                DemoStudy.Walk walk = new DemoStudy.Walk(name, 0.50 + 0.12 * share, 0.96 + 0.18 * share);
                C3dWriter.write(of.resolve(name + ".c3d"), walk.recorder().walking(DemoStudy.points(false)));
            }
        }
    }

    /**
     * Writes the recordings with the three files of the study filled in.
     *
     * @param folder made where it is missing
     * @param subjects how many
     * @param walks of each
     * @throws IOException where it cannot be written
     */
    public static void writeWhole(Path folder, int subjects, int walks) throws IOException {
        write(folder, subjects, walks);
        Files.writeString(
                folder.resolve("study.xml"),
                "<study xmlns=\"urn:solewright:study:1\" name=\"invented\" date=\"2026-03-01\">\n"
                        + "  <landmarks file=\"landmarks.xml\"/>\n  <laboratory floor=\"0\"/>\n</study>\n",
                StandardCharsets.UTF_8);
        StringBuilder who = new StringBuilder("id,mass_kg,population,sex\n");
        StringBuilder what = new StringBuilder("subject,kind,file\n");
        for (int s = 1; s <= subjects; s++) {
            String id = String.format(Locale.ROOT, "P%03d", s);
            who.append(id).append(",70,adult,female\n");
            what.append(id).append(",standing,").append(id).append("/standing.c3d\n");
            for (int w = 1; w <= walks; w++) {
                what.append(id)
                        .append(",walking,")
                        .append(id)
                        .append("/walking-")
                        .append(w)
                        .append(".c3d\n");
            }
        }
        Files.writeString(folder.resolve("subjects.csv"), who, StandardCharsets.UTF_8);
        Files.writeString(folder.resolve("trials.csv"), what, StandardCharsets.UTF_8);
    }

    /**
     * Writes a study.
     *
     * @param args folder, subjects, walks of each
     * @throws IOException where it cannot be written
     */
    public static void main(String[] args) throws IOException {
        writeWhole(Path.of(args[0]), Integer.parseInt(args[1]), Integer.parseInt(args[2]));
    }
}
