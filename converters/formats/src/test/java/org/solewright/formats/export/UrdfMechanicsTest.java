package org.solewright.formats.export;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.ByteArrayInputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;
import java.util.stream.Collectors;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.Test;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.geometry.Vec3;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

/**
 * Total mass, centre of mass and joint-space mass matrix of an exported robot are those of its model. The numbers of
 * the model, and the files, stay in {@code target/rigid-body} for the check by another library (src/check).
 */
class UrdfMechanicsTest {

    private static final double[][] IDENTITY = {{1, 0, 0}, {0, 1, 0}, {0, 0, 1}};

    /** A body that moves: what carries it, its joint, its mass. */
    private static final class Body {
        int parent = -1;
        double[] origin = new double[3];
        double[] axis = {0, 0, 0};
        double mass;
        double[] com = new double[3];
        double[][] inertia = new double[3][3];
    }

    /** Mass, centre and matrix of a tree in one pose. */
    private record State(double mass, List<Double> com, List<Double> matrix) {}

    private static double[] zUp(Vec3 v) {
        return new double[] {v.x(), -v.z(), v.y()};
    }

    /** The model's bodies: massless ones between the axes of a joint, all axes in the frame of the proximal segment. */
    private static List<Body> bodies(FootModel model) {
        List<Body> bodies = new ArrayList<>();
        Map<String, Integer> at = new HashMap<>();
        for (Segment s : model.segments()) {
            int parent = -1;
            Joint joint = model.joints().stream()
                    .filter(j -> j.distal() == s.name())
                    .findFirst()
                    .orElse(null);
            if (joint != null) {
                parent = at.get(joint.proximal().word());
                List<Vec3> axes = joint.kind() == Joint.Kind.BALL
                        ? List.of(new Vec3(1, 0, 0), new Vec3(0, 0, -1), new Vec3(0, 1, 0))
                        : joint.axes().stream().map(Joint.Axis::direction).toList();
                for (int i = 0; i < axes.size(); i++) {
                    Body b = new Body();
                    b.parent = parent;
                    b.origin = i == 0 ? zUp(joint.centre().position()) : new double[3];
                    b.axis = zUp(axes.get(i));
                    bodies.add(b);
                    parent = bodies.size() - 1;
                }
            } else {
                bodies.add(new Body());
            }
            Body own = bodies.get(bodies.size() - 1);
            own.mass = s.mass().value();
            own.com = zUp(s.centreOfMass().position());
            var t = s.inertia();
            own.inertia =
                    new double[][] {{t.xx(), -t.xz(), t.xy()}, {-t.xz(), t.zz(), -t.yz()}, {t.xy(), -t.yz(), t.yy()}};
            at.put(s.name().word(), bodies.size() - 1);
        }
        return bodies;
    }

    /** The robot's bodies, from its file alone. */
    private static List<Body> bodies(byte[] urdf) throws Exception {
        Element root = DocumentBuilderFactory.newInstance()
                .newDocumentBuilder()
                .parse(new ByteArrayInputStream(urdf))
                .getDocumentElement();
        List<Body> bodies = new ArrayList<>();
        Map<String, Integer> at = new HashMap<>();
        NodeList links = root.getElementsByTagName("link");
        for (int i = 0; i < links.getLength(); i++) {
            Element link = (Element) links.item(i);
            Element inertial = (Element) link.getElementsByTagName("inertial").item(0);
            Body b = new Body();
            b.mass = Double.parseDouble(child(inertial, "mass").getAttribute("value"));
            b.com = triple(child(inertial, "origin").getAttribute("xyz"));
            Element t = child(inertial, "inertia");
            String[][] names = {{"ixx", "ixy", "ixz"}, {"ixy", "iyy", "iyz"}, {"ixz", "iyz", "izz"}};
            for (int r = 0; r < 3; r++) {
                for (int c = 0; c < 3; c++) {
                    b.inertia[r][c] = Double.parseDouble(t.getAttribute(names[r][c]));
                }
            }
            bodies.add(b);
            at.put(link.getAttribute("name"), i);
        }
        NodeList joints = root.getElementsByTagName("joint");
        for (int i = 0; i < joints.getLength(); i++) {
            Element joint = (Element) joints.item(i);
            Body b = bodies.get(at.get(child(joint, "child").getAttribute("link")));
            b.parent = at.get(child(joint, "parent").getAttribute("link"));
            b.origin = triple(child(joint, "origin").getAttribute("xyz"));
            b.axis = triple(child(joint, "axis").getAttribute("xyz"));
        }
        return bodies;
    }

    private static Element child(Element e, String name) {
        return (Element) e.getElementsByTagName(name).item(0);
    }

    private static double[] triple(String text) {
        return Arrays.stream(text.split(" ")).mapToDouble(Double::parseDouble).toArray();
    }

    /** The composite of what hangs from each joint, as kinetic energy of unit joint speeds: M = sum m v v + w I w. */
    private static State state(List<Body> bodies, double[] q) {
        int n = bodies.size();
        double[][][] turn = new double[n][][];
        double[][] place = new double[n][];
        double[][] axis = new double[n][];
        double[][] centre = new double[n][];
        double total = 0;
        double[] com = new double[3];
        for (int i = 0; i < n; i++) {
            Body b = bodies.get(i);
            double[][] r = b.parent < 0 ? IDENTITY : turn[b.parent];
            place[i] = b.parent < 0 ? new double[3] : plus(place[b.parent], times(r, b.origin));
            axis[i] = times(r, b.axis);
            turn[i] = b.parent < 0 ? r : times(r, about(b.axis, q[i - 1]));
            centre[i] = plus(place[i], times(turn[i], b.com));
            total += b.mass;
            for (int k = 0; k < 3; k++) {
                com[k] += b.mass * centre[i][k];
            }
        }
        double[] matrix = new double[(n - 1) * (n - 1)];
        for (int body = 1; body < n; body++) {
            Body b = bodies.get(body);
            double[][] inertia = times(times(turn[body], b.inertia), transposed(turn[body]));
            for (int i = body; i > 0; i = bodies.get(i).parent) {
                double[] v = cross(axis[i], minus(centre[body], place[i]));
                double[] h = times(inertia, axis[i]);
                for (int j = body; j > 0; j = bodies.get(j).parent) {
                    double[] u = cross(axis[j], minus(centre[body], place[j]));
                    matrix[(i - 1) * (n - 1) + j - 1] += b.mass * dot(v, u) + dot(h, axis[j]);
                }
            }
        }
        double mass = total;
        return new State(
                mass,
                Arrays.stream(com).map(x -> x / mass).boxed().toList(),
                Arrays.stream(matrix).boxed().toList());
    }

    @Test
    void massCentreAndMatrixAreTheModels() throws Exception {
        Path folder = Files.createDirectories(Path.of("target", "rigid-body"));
        long seed = 20261201;
        Random random = new Random(seed);
        for (FootModel model : InventedFoot.all()) {
            byte[] urdf = Exports.run("urdf", model).content();
            List<Body> ours = bodies(model);
            List<Body> read = bodies(urdf);
            assertThat(read).hasSameSizeAs(ours);
            StringBuilder expected = new StringBuilder();
            for (int pose = 0; pose < 3; pose++) {
                double[] q = new double[ours.size() - 1];
                for (int i = 0; i < q.length; i++) {
                    q[i] = pose == 0 ? 0 : random.nextDouble() - 0.5;
                }
                State a = state(ours, q);
                State b = state(read, q);
                double scale = a.matrix().stream().mapToDouble(Math::abs).max().orElseThrow();
                // The links between axes carry 1e-9 of a segment; the check's own limit is 1e-6.
                assertThat(b.mass()).isCloseTo(a.mass(), within(1e-12));
                for (int i = 0; i < 3; i++) {
                    assertThat(b.com().get(i)).isCloseTo(a.com().get(i), within(1e-8));
                }
                for (int i = 0; i < a.matrix().size(); i++) {
                    assertThat(b.matrix().get(i))
                            .as("seed %d", seed)
                            .isCloseTo(a.matrix().get(i), within(1e-8 * scale));
                }
                expected.append("mass ").append(a.mass()).append('\n');
                expected.append("pose ")
                        .append(Arrays.stream(q).mapToObj(Double::toString).collect(Collectors.joining(" ")))
                        .append('\n');
                expected.append("com ")
                        .append(a.com().stream().map(Object::toString).collect(Collectors.joining(" ")))
                        .append('\n');
                expected.append("matrix ")
                        .append(a.matrix().stream().map(Object::toString).collect(Collectors.joining(" ")))
                        .append('\n');
            }
            String name = model.side().word() + "-" + model.segments().size() + "-"
                    + model.segments().get(1).name().word().toLowerCase(Locale.ROOT) + "-"
                    + model.segments().get(model.segments().size() - 1).name().word();
            Files.write(folder.resolve(name + ".urdf"), urdf);
            Files.writeString(folder.resolve(name + ".expected"), expected);
        }
    }

    private static double[][] about(double[] a, double angle) {
        double c = Math.cos(angle);
        double s = Math.sin(angle);
        double[][] r = new double[3][3];
        double[][] skew = {{0, -a[2], a[1]}, {a[2], 0, -a[0]}, {-a[1], a[0], 0}};
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                r[i][j] = (i == j ? c : 0) + (1 - c) * a[i] * a[j] + s * skew[i][j];
            }
        }
        return r;
    }

    private static double[][] times(double[][] a, double[][] b) {
        double[][] r = new double[3][3];
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                r[i][j] = a[i][0] * b[0][j] + a[i][1] * b[1][j] + a[i][2] * b[2][j];
            }
        }
        return r;
    }

    private static double[] times(double[][] a, double[] v) {
        return new double[] {dot(a[0], v), dot(a[1], v), dot(a[2], v)};
    }

    private static double[][] transposed(double[][] a) {
        return new double[][] {{a[0][0], a[1][0], a[2][0]}, {a[0][1], a[1][1], a[2][1]}, {a[0][2], a[1][2], a[2][2]}};
    }

    private static double[] plus(double[] a, double[] b) {
        return new double[] {a[0] + b[0], a[1] + b[1], a[2] + b[2]};
    }

    private static double[] minus(double[] a, double[] b) {
        return new double[] {a[0] - b[0], a[1] - b[1], a[2] - b[2]};
    }

    private static double[] cross(double[] a, double[] b) {
        return new double[] {a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]};
    }

    private static double dot(double[] a, double[] b) {
        return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
    }
}
