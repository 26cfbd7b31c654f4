package org.solewright.formats.export;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** Names of the joints and segments of a leg, and what they hang from [ISO/IEC 19774-1:2019, level of articulation 4]. */
final class HanimNames {

    private static final int GREAT_TOE = 1;
    private static final int LAST_MEDIAL_RAY = 3;
    private static final int RAYS = 5;
    private static final Map<String, String> JOINTS = new TreeMap<>();
    private static final Map<String, String> SEGMENTS = new TreeMap<>();

    static {
        add("knee", "hip", "calf");
        add("talocrural", "knee", "talus");
        add("talocalcaneonavicular", "talocrural", "navicular");
        add("calcaneocuboid", "talocrural", "calcaneus");
        add("transversetarsal", "calcaneocuboid", "cuboid");
        for (int ray = 1; ray <= RAYS; ray++) {
            boolean isMedial = ray <= LAST_MEDIAL_RAY;
            if (isMedial) {
                add("cuneonavicular_" + ray, "talocalcaneonavicular", "cuneiform_" + ray);
            }
            add("tarsometatarsal_" + ray, isMedial ? "cuneonavicular_" + ray : "transversetarsal", "metatarsal_" + ray);
            add("metatarsophalangeal_" + ray, "tarsometatarsal_" + ray, "tarsal_proximal_phalanx_" + ray);
            if (ray == GREAT_TOE) {
                add("tarsal_interphalangeal_1", "metatarsophalangeal_1", "tarsal_distal_phalanx_1");
            } else {
                String middle = "tarsal_proximal_interphalangeal_" + ray;
                add(middle, "metatarsophalangeal_" + ray, "tarsal_middle_phalanx_" + ray);
                add("tarsal_distal_interphalangeal_" + ray, middle, "tarsal_distal_phalanx_" + ray);
            }
        }
        for (String side : List.of("l_", "r_")) {
            JOINTS.put(side + "hip", "sacroiliac");
            SEGMENTS.put(side + "thigh", side + "hip");
        }
        JOINTS.put("sacroiliac", "humanoid_root");
        JOINTS.put("humanoid_root", "");
        SEGMENTS.put("sacrum", "humanoid_root");
        SEGMENTS.put("pelvis", "sacroiliac");
    }

    private HanimNames() {}

    private static void add(String joint, String parent, String segment) {
        for (String side : List.of("l_", "r_")) {
            JOINTS.put(side + joint, side + parent);
            SEGMENTS.put(side + segment, side + joint);
        }
    }

    /**
     * The joints above a joint, from its parent up; a file of a lower level of articulation leaves some of them out.
     *
     * @param joint the standard's name
     * @return empty where the name is none of a leg, or the root
     */
    static List<String> above(String joint) {
        List<String> found = new ArrayList<>();
        String parent = JOINTS.getOrDefault(joint, "");
        while (!parent.isEmpty()) {
            found.add(parent);
            parent = JOINTS.getOrDefault(parent, "");
        }
        return found;
    }

    static boolean isJoint(String name) {
        return JOINTS.containsKey(name);
    }

    /**
     * The joint a segment hangs from.
     *
     * @param segment the standard's name
     * @return empty where the name is none of a leg
     */
    static String jointOf(String segment) {
        return SEGMENTS.getOrDefault(segment, "");
    }
}
