package org.solewright.formats.export;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import javax.xml.XMLConstants;
import javax.xml.parsers.DocumentBuilder;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.solewright.domain.finding.Finding;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.w3c.dom.NodeList;
import org.xml.sax.SAXException;
import org.xml.sax.helpers.DefaultHandler;

/**
 * Checks of what a template wrote, where it is URDF or X3D: common checkers of these formats let masses below zero,
 * unknown joints and broken tensors pass. Other output is not looked at.
 */
final class OutputChecks {

    private static final int NINE = 9;

    private final List<Finding> findings = new ArrayList<>();

    private OutputChecks() {}

    static List<Finding> of(byte[] content) {
        int start = 0;
        while (start < content.length && Character.isWhitespace(content[start])) {
            start++;
        }
        if (start == content.length || content[start] != '<') {
            return List.of();
        }
        OutputChecks checks = new OutputChecks();
        try {
            DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
            factory.setFeature(XMLConstants.FEATURE_SECURE_PROCESSING, true);
            factory.setFeature("http://apache.org/xml/features/nonvalidating/load-external-dtd", false);
            factory.setFeature("http://xml.org/sax/features/external-general-entities", false);
            factory.setFeature("http://xml.org/sax/features/external-parameter-entities", false);
            DocumentBuilder builder = factory.newDocumentBuilder();
            builder.setErrorHandler(new DefaultHandler());
            Document document = builder.parse(new ByteArrayInputStream(content));
            String root = document.getDocumentElement().getNodeName();
            if (root.equals("robot")) {
                checks.urdf(document);
            } else if (root.equals("X3D")) {
                checks.x3d(document);
            }
        } catch (SAXException e) {
            return List.of(Finding.warning(
                    "export.output-not-xml", "output", "begins like XML and is none: " + e.getMessage()));
        } catch (ParserConfigurationException | IOException e) {
            throw new IllegalStateException("bytes in memory cannot be read", e);
        }
        return checks.findings;
    }

    private void wrong(String where, String message) {
        findings.add(Finding.error("export.output-impossible", where, message));
    }

    private void urdf(Document document) {
        Set<String> links = new HashSet<>();
        for (Element link : children(document.getDocumentElement(), "link")) {
            String name = link.getAttribute("name");
            unique("link", name, links);
            for (Element inertial : children(link, "inertial")) {
                mass(name, first(inertial, "mass", "value"));
                double[] t = new double[NINE];
                int at = 0;
                for (String a : List.of("ixx", "ixy", "ixz", "ixy", "iyy", "iyz", "ixz", "iyz", "izz")) {
                    t[at++] = number(first(inertial, "inertia", a));
                }
                tensor(name, t);
            }
        }
        Set<String> joints = new HashSet<>();
        Map<String, String> parents = new HashMap<>();
        for (Element joint : children(document.getDocumentElement(), "joint")) {
            String name = joint.getAttribute("name");
            unique("joint", name, joints);
            String parent = first(joint, "parent", "link");
            String child = first(joint, "child", "link");
            if (!links.contains(parent) || !links.contains(child)) {
                wrong("joint " + name, "between '" + parent + "' and '" + child + "', expected links of the file");
            }
            if (parents.put(child, parent) != null) {
                wrong("link " + child, "is the child of two joints, expected one");
            }
        }
        if (links.size() - parents.size() != 1) {
            wrong("robot", (links.size() - parents.size()) + " links that no joint carries, expected one");
        }
    }

    private void x3d(Document document) {
        NodeList segments = document.getElementsByTagName("HAnimSegment");
        for (int i = 0; i < segments.getLength(); i++) {
            Element s = (Element) segments.item(i);
            if (s.hasAttribute("USE")) {
                continue;
            }
            String name = s.getAttribute("name");
            mass(name, s.getAttribute("mass"));
            String[] words = s.getAttribute("momentsOfInertia").strip().split("[\\s,]+", -1);
            if (words.length == NINE) {
                double[] t = new double[NINE];
                for (int k = 0; k < NINE; k++) {
                    t[k] = number(words[k]);
                }
                tensor(name, t);
            } else {
                wrong(name, words.length + " values of inertia, expected nine");
            }
            segmentPlace(s, name);
        }
        NodeList joints = document.getElementsByTagName("HAnimJoint");
        Set<String> seen = new HashSet<>();
        for (int i = 0; i < joints.getLength(); i++) {
            Element j = (Element) joints.item(i);
            if (!j.hasAttribute("USE")) {
                String name = j.getAttribute("name");
                unique("joint", name, seen);
                jointPlace(j, name);
            }
        }
    }

    private void segmentPlace(Element element, String name) {
        String expected = HanimNames.jointOf(name);
        if (expected.isEmpty()) {
            unknown("segment", name);
        } else if (!parent(element).equals(expected)) {
            wrong("segment " + name, "hangs from '" + parent(element) + "', the standard has '" + expected + "'");
        }
    }

    private void jointPlace(Element element, String name) {
        List<String> above = HanimNames.above(name);
        if (!HanimNames.isJoint(name)) {
            unknown("joint", name);
        } else if (!above.isEmpty() && !above.contains(parent(element))) {
            wrong("joint " + name, "hangs from '" + parent(element) + "', the standard has '" + above.get(0) + "'");
        }
    }

    private void unknown(String what, String name) {
        findings.add(Finding.warning(
                "export.hanim-name", what + " " + name, "is no " + what + " of a leg in ISO/IEC 19774-1: not checked"));
    }

    private static String parent(Element element) {
        return element.getParentNode() instanceof Element above
                        && above.getTagName().equals("HAnimJoint")
                ? above.getAttribute("name")
                : "";
    }

    private void unique(String what, String name, Set<String> seen) {
        if (name.isEmpty() || !seen.add(name)) {
            wrong(what + " '" + name + "'", name.isEmpty() ? "has no name" : "occurs twice");
        }
    }

    private void mass(String where, String text) {
        double mass = number(text);
        if (!(mass > 0) || mass == Double.POSITIVE_INFINITY) {
            wrong(where, "mass '" + text + "' kg, expected more than 0 kg");
        }
    }

    private void tensor(String where, double[] t) {
        if (!TensorCheck.isPossible(t)) {
            wrong(where, "its inertia can be of no body");
        }
    }

    private static double number(String text) {
        try {
            return Double.parseDouble(text);
        } catch (NumberFormatException e) {
            return Double.NaN;
        }
    }

    private static String first(Element parent, String name, String attribute) {
        List<Element> found = children(parent, name);
        return found.isEmpty() ? "" : found.get(0).getAttribute(attribute);
    }

    private static List<Element> children(Element parent, String name) {
        List<Element> found = new ArrayList<>();
        for (Node n = parent.getFirstChild(); n != null; n = n.getNextSibling()) {
            if (n instanceof Element e && e.getTagName().equals(name)) {
                found.add(e);
            }
        }
        return found;
    }
}
