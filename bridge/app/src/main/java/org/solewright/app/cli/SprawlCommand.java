package org.solewright.app.cli;

import java.nio.file.Path;
import java.util.Locale;
import java.util.concurrent.Callable;
import org.solewright.app.pipeline.Sprawl;
import org.solewright.app.pipeline.UseCaseException;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** A sprawled limb on a spherical foot. */
@Command(
        name = "sprawl",
        description = "Writes the knee track and the toe curve of a sprawled limb that rolls on a spherical foot.",
        footer = {
            "",
            "Example: a femur of 60 mm that turns from 40 degrees before the side to as much behind it",
            "  solewright sprawl --femur 0.06 --hip-height 0.06 --sphere-radius 0.05 --speed 0.3 --protraction 40deg"
                    + " --stance-time 0.4 --out limb",
            "writes limb/knee-track.csv, toe-curve.csv, toe-segments.csv and the plan view sprawl.svg."
        })
final class SprawlCommand implements Callable<Integer> {

    @Spec
    private CommandSpec spec = CommandSpec.create();

    @Option(names = "--femur", required = true, paramLabel = "M", description = "Length of the femur, m.")
    private double femur;

    @Option(names = "--hip-height", required = true, paramLabel = "M", description = "Height of the hip, m.")
    private double hipHeight;

    @Option(
            names = "--sphere-radius",
            required = true,
            paramLabel = "M",
            description = "Radius of the foot's sphere about the knee, m: also the height of the knee.")
    private double sphereRadius;

    @Option(names = "--speed", required = true, paramLabel = "M_S", description = "Speed of the hip, m/s.")
    private double speed;

    @Option(
            names = "--protraction",
            required = true,
            paramLabel = "ANGLE",
            description = "Angle of the femur before the side at the start of the stance, as much behind it at the end:"
                    + " rad, or degrees as 40deg.")
    private String protraction = "";

    @Option(names = "--stance-time", required = true, paramLabel = "S", description = "Duration of the stance, s.")
    private double stanceTime;

    @Option(
            names = "--segments",
            paramLabel = "N",
            defaultValue = "3",
            description = "Toe segments that stand for the curve; default ${DEFAULT-VALUE}.")
    private int segments;

    @Option(names = "--out", required = true, paramLabel = "DIR", description = "Folder for the files.")
    private Path out = Path.of("");

    /** For picocli. */
    SprawlCommand() {}

    @Override
    public Integer call() throws UseCaseException {
        Sprawl.Request request =
                new Sprawl.Request(femur, hipHeight, sphereRadius, speed, angle(protraction), stanceTime, segments);
        Sprawl.write(request, out).forEach(spec.commandLine().getOut()::println);
        return ExitCode.DONE;
    }

    private static double angle(String text) throws UseCaseException {
        String given = text.strip().toLowerCase(Locale.ROOT);
        boolean isDegrees = given.endsWith("deg");
        try {
            double number = Double.parseDouble(isDegrees ? given.substring(0, given.length() - 3) : given);
            return isDegrees ? Math.toRadians(number) : number;
        } catch (NumberFormatException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.USAGE,
                    "--protraction",
                    "is '" + text + "'",
                    "give a number of rad, or of degrees as 40deg",
                    e);
        }
    }
}
