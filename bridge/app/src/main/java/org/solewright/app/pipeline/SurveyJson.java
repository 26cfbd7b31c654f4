package org.solewright.app.pipeline;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.geometry.Vec3;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.formats.c3d.C3dParameter;
import org.solewright.formats.c3d.C3dPlatform;

/** A survey as one line of JSON. */
public final class SurveyJson {

    private static final ObjectMapper MAPPER = new ObjectMapper();
    private static final JsonNodeFactory NODES = JsonNodeFactory.instance;

    private SurveyJson() {}

    /**
     * The survey of a file that was read.
     *
     * @param survey the survey
     * @return one line
     */
    public static String line(Survey survey) {
        ObjectNode root = NODES.objectNode();
        root.put("file", survey.path().toString());
        root.put("processor", survey.file().processor().word());
        root.put("storage", survey.file().isReal() ? "real" : "integer");
        ObjectNode points = root.putObject("points");
        points.put("count", survey.file().points().points());
        points.put("frames", survey.frames());
        points.put("firstFrame", survey.file().firstFrame());
        number(points, "rate_Hz", survey.file().rate());
        points.put("unit", survey.file().unit());
        survey.file().labels().subList(0, survey.file().storedLabels()).forEach(points.putArray("labels")::add);
        survey.file().labels().forEach(points.putArray("names")::add);
        ObjectNode analog = root.putObject("analog");
        analog.put("channels", survey.file().analog().channels());
        number(analog, "rate_Hz", survey.file().analog().rate());
        survey.file()
                .analogLabels()
                .subList(0, survey.file().storedAnalogLabels())
                .forEach(analog.putArray("labels")::add);
        survey.file().analogLabels().forEach(analog.putArray("names")::add);
        platforms(root.putArray("platforms"), survey);
        ArrayNode events = root.putArray("events");
        for (RecordedEvent e : survey.file().events()) {
            events.addObject()
                    .put("label", e.label())
                    .put("context", e.context())
                    .put("time_s", e.time());
        }
        ObjectNode groups = root.putObject("groups");
        for (C3dParameter p : survey.file().parameters().all()) {
            groups.put(p.group(), groups.path(p.group()).asInt() + 1);
        }
        if (!survey.isHeaderOnly()) {
            ArrayNode gaps = root.putArray("gaps");
            for (Survey.Gaps g : survey.gaps()) {
                if (g.lost() > 0) {
                    gaps.addObject()
                            .put("label", g.label())
                            .put("lostFrames", g.lost())
                            .put("longestGap", g.longest());
                }
            }
        }
        findings(root.putArray("findings"), survey.findings());
        return text(root);
    }

    /**
     * The survey of a file that could not be read.
     *
     * @param file as the user named it
     * @param finding what is wrong and what to do
     * @return one line
     */
    public static String failed(String file, Finding finding) {
        ObjectNode root = NODES.objectNode();
        root.put("file", file);
        findings(root.putArray("findings"), List.of(finding));
        return text(root);
    }

    private static void platforms(ArrayNode out, Survey survey) {
        for (C3dPlatform p : survey.file().platforms()) {
            ObjectNode node = out.addObject();
            node.put("number", p.number());
            node.put("type", p.type());
            ArrayNode corners = node.putArray("corners_m");
            for (Vec3 c : survey.corners(p)) {
                corners.addArray().add(c.x()).add(c.y()).add(c.z());
            }
            if (!survey.isHeaderOnly()) {
                number(node, "peakVertical_N", survey.peakVertical(p.number()));
            }
        }
    }

    private static void findings(ArrayNode out, List<Finding> findings) {
        for (Finding f : findings) {
            ObjectNode node = out.addObject();
            node.put("code", f.code());
            node.put("severity", f.severity().word());
            node.put("message", (f.where().isEmpty() ? "" : f.where() + ": ") + f.message());
        }
    }

    private static void number(ObjectNode node, String name, double value) {
        if (Double.isFinite(value)) {
            node.put(name, value);
        } else {
            node.putNull(name);
        }
    }

    private static String text(ObjectNode root) {
        try {
            return MAPPER.writeValueAsString(root);
        } catch (JsonProcessingException e) {
            throw new IllegalStateException("a tree of our own cannot be written as JSON", e);
        }
    }
}
