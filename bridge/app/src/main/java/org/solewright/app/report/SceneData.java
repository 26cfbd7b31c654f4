package org.solewright.app.report;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.geometry.Pose;
import org.solewright.domain.geometry.Rotation;
import org.solewright.domain.geometry.Vec3;

/** What the script of the moving view draws, as JSON: parts, joints, pads, arc in their segments' frames, and instants. */
final class SceneData {

    private final FootModel model;
    private final FootShape shape;
    private final StringBuilder json = new StringBuilder();

    private SceneData(FootModel model, FootShape shape) {
        this.model = model;
        this.shape = shape;
    }

    static String of(FootModel model, FootShape shape, List<FootRoll.Instant> instants) {
        SceneData data = new SceneData(model, shape);
        data.parts();
        data.joints();
        data.pads();
        data.arc();
        data.instants(instants);
        return data.json.append("}").toString();
    }

    /** The posture of the model itself, where no stance was tracked. */
    static FootRoll.Instant standing(FootModel model, FootShape shape) {
        java.util.Map<SegmentName, Pose> poses = new java.util.EnumMap<>(SegmentName.class);
        Vec3 up = new Vec3(0, -shape.floor(), 0);
        model.segments()
                .forEach(s -> poses.put(
                        s.name(),
                        new Pose(Rotation.IDENTITY, shape.origin(s.name()).plus(up))));
        return new FootRoll.Instant(0, poses, Optional.empty(), 0);
    }

    private void parts() {
        json.append("{\"parts\":[");
        boolean isFirst = true;
        for (FootShape.Part part : shape.parts()) {
            json.append(isFirst ? "" : ",")
                    .append("{\"name\":\"")
                    .append(part.name().word())
                    .append("\",\"around\":")
                    .append(FootShape.AROUND)
                    .append(",\"points\":[");
            isFirst = false;
            boolean isFirstPoint = true;
            for (List<Vec3> ring : part.sections()) {
                for (Vec3 p : ring) {
                    json.append(isFirstPoint ? "" : ",");
                    isFirstPoint = false;
                    vector(p);
                }
            }
            json.append("]}");
        }
        json.append("]");
    }

    private void joints() {
        json.append(",\"joints\":[");
        boolean isFirst = true;
        for (Joint joint : model.joints()) {
            json.append(isFirst ? "" : ",")
                    .append("{\"name\":\"")
                    .append(joint.name())
                    .append("\",\"part\":\"")
                    .append(joint.proximal().word())
                    .append("\",\"at\":[");
            isFirst = false;
            vector(joint.centre().position());
            json.append("],\"axes\":[");
            boolean isFirstAxis = true;
            for (Joint.Axis axis : joint.axes()) {
                json.append(isFirstAxis ? "[" : ",[");
                isFirstAxis = false;
                vector(axis.direction());
                json.append("]");
            }
            json.append("]}");
        }
        json.append("]");
    }

    private void pads() {
        json.append(",\"pads\":[");
        boolean isFirst = true;
        for (Pad pad : model.pads()) {
            json.append(isFirst ? "" : ",")
                    .append("{\"part\":\"")
                    .append(pad.segment().word())
                    .append("\",\"r\":");
            number(pad.radius());
            json.append(",\"at\":[");
            isFirst = false;
            vector(pad.centre());
            json.append("]}");
        }
        json.append("]");
    }

    private void arc() {
        json.append(",\"arc\":[");
        boolean isFirst = true;
        for (Vec3 p : ArcLine.of(model, shape)) {
            json.append(isFirst ? "" : ",");
            isFirst = false;
            vector(p);
        }
        json.append("]");
    }

    private void instants(List<FootRoll.Instant> instants) {
        json.append(",\"instants\":[");
        boolean isFirst = true;
        for (FootRoll.Instant instant : instants) {
            json.append(isFirst ? "" : ",").append("{\"t\":");
            isFirst = false;
            number(instant.percent());
            json.append(",\"load\":")
                    .append(String.format(Locale.ROOT, "%.0f", instant.vertical()))
                    .append(",\"cop\":[");
            instant.centreOfPressure().ifPresent(this::vector);
            json.append("],\"pose\":{");
            boolean isFirstPose = true;
            for (SegmentName name : SegmentName.values()) {
                Pose pose = instant.poses().get(name);
                if (pose == null) {
                    continue;
                }
                json.append(isFirstPose ? "\"" : ",\"").append(name.word()).append("\":[");
                isFirstPose = false;
                vector(pose.rotation().x());
                json.append(',');
                vector(pose.rotation().y());
                json.append(',');
                vector(pose.rotation().z());
                json.append(',');
                vector(pose.position());
                json.append("]");
            }
            json.append("}}");
        }
        json.append("]");
    }

    private void vector(Vec3 v) {
        number(v.x());
        json.append(',');
        number(v.y());
        json.append(',');
        number(v.z());
    }

    /** A tenth of a millimetre is finer than the view. */
    private void number(double value) {
        String text = String.format(Locale.ROOT, "%.4f", value);
        int end = text.length();
        while (text.charAt(end - 1) == '0') {
            end--;
        }
        text = text.substring(0, text.charAt(end - 1) == '.' ? end - 1 : end);
        json.append(text.equals("-0") ? "0" : text);
    }
}
