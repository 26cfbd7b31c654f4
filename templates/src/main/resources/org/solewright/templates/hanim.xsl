<?xml version="1.0" encoding="UTF-8"?>
<!-- A foot model as X3D 4.0 with the HAnim component (ISO/IEC 19775-1, 19774-1), version 1: x to the left, y up, z forward;
     m, kg, rad; origin on the floor below the first segment's origin. Joints are the standard's chain of this leg down
     to the last that the model has, at level of articulation 4; those that the model does not have are rigid. A segment
     of the model is the standard's that hangs where it moves; what it stands for is in its metadata. -->
<xsl:stylesheet version="3.0" xmlns:xsl="http://www.w3.org/1999/XSL/Transform" xmlns:xs="http://www.w3.org/2001/XMLSchema"
    xmlns:m="urn:solewright:foot-model:1" xmlns:sw="urn:solewright:functions:1" exclude-result-prefixes="#all">

  <xsl:import href="solewright:functions.xsl"/>
  <xsl:output method="xml" indent="yes" encoding="UTF-8"/>

  <xsl:variable name="axes" select="sw:frame('hanim')"/>
  <xsl:variable name="model" select="/m:footModel"/>
  <xsl:variable name="letter" select="if ($model/@side = 'left') then 'l_' else 'r_'"/>
  <xsl:variable name="first" select="$model/m:segments/m:segment[1]"/>

  <!-- Height of the first segment's origin above the floor: the lowest pad's underside, else the lowest landmark. -->
  <xsl:variable name="low" select="for $p in $model/m:contacts/m:pad return sw:offset($model, $p/@segment)[2] + $p/@y - $p/@radius"/>
  <xsl:variable name="lowest" select="if (exists($low)) then min($low)
      else min((for $l in $model/m:landmarks/m:landmark return sw:offset($model, $l/@segment)[2] + $l/@y, 0e0))"/>
  <xsl:variable name="origin" select="0e0, -$lowest, 0e0"/>

  <!-- The standard's chain of the leg [ISO/IEC 19774-1:2019], and the segments of the model that hang there. -->
  <xsl:variable name="chain">
    <j name="humanoid_root"/>
    <j name="sacroiliac"/>
    <j name="hip"/>
    <j name="knee" segment="calf" of="shank"/>
    <j name="talocrural" segment="talus" of="foot hindfoot"/>
    <j name="talocalcaneonavicular" segment="navicular" of="midfoot"/>
    <j name="cuneonavicular_2"/>
    <j name="tarsometatarsal_2" segment="metatarsal_2" of="forefoot"/>
    <j name="metatarsophalangeal_2" segment="tarsal_proximal_phalanx_2" of="toes phalanx_1"/>
    <j name="tarsal_proximal_interphalangeal_2" segment="tarsal_middle_phalanx_2" of="phalanx_2"/>
    <j name="tarsal_distal_interphalangeal_2" segment="tarsal_distal_phalanx_2" of="phalanx_3"/>
  </xsl:variable>

  <!-- The joint of the chain that a joint of the model is; a forefoot without a midfoot moves at the midtarsal joint, and
       whatever hangs on the shank at the talocrural one. -->
  <xsl:function name="sw:role" as="xs:string">
    <xsl:param name="joint" as="element(m:joint)"/>
    <xsl:sequence select="if ($joint/@proximal = 'shank') then 'talocrural'
        else if ($joint/@distal = 'forefoot' and $joint/@proximal = 'hindfoot') then 'talocalcaneonavicular'
        else string($chain/j[tokenize(@of, ' ') = $joint/@distal]/@name)"/>
  </xsl:function>

  <xsl:function name="sw:joint" as="element(m:joint)?">
    <xsl:param name="j" as="element(j)"/>
    <xsl:sequence select="$model/m:joints/m:joint[sw:role(.) = $j/@name]"/>
  </xsl:function>

  <xsl:function name="sw:segment" as="element(m:segment)?">
    <xsl:param name="j" as="element(j)"/>
    <xsl:sequence select="$model/m:segments/m:segment[@name = tokenize($j/@of, ' ')]"/>
  </xsl:function>

  <xsl:function name="sw:place" as="xs:double*">
    <xsl:param name="segment" as="xs:string"/>
    <xsl:param name="vector" as="xs:double*"/>
    <xsl:sequence select="sw:turn($axes, sw:plus($origin, sw:plus(sw:offset($model, $segment), $vector)))"/>
  </xsl:function>

  <!-- Where a joint is: its own centre, else that of the next one below, else above; the hip above the knee, a limb length up. -->
  <xsl:function name="sw:centre" as="xs:double*">
    <xsl:param name="j" as="element(j)"/>
    <xsl:variable name="below" select="(($j, $j/following-sibling::j)[exists(sw:joint(.))], $j/preceding-sibling::j[exists(sw:joint(.))][last()])[1]"/>
    <xsl:sequence select="if ($j/@name = ('humanoid_root', 'sacroiliac', 'hip')) then
          sw:turn($axes, (0e0, xs:double($model/m:subject/@limbLength), 0e0))
        else if ($j/@name = 'knee') then sw:place($first/@name, (0e0, 0e0, 0e0))
        else sw:place(sw:joint($below)/@proximal, sw:vector(sw:joint($below)/m:centre))"/>
  </xsl:function>

  <xsl:variable name="last" select="($chain/j[exists(sw:segment(.))])[last()]"/>
  <xsl:variable name="used" select="$chain/j[. is $last or . &lt;&lt; $last]"/>

  <xsl:function name="sw:name" as="xs:string">
    <xsl:param name="name" as="xs:string"/>
    <xsl:sequence select="if ($name = ('humanoid_root', 'sacroiliac')) then $name else concat($letter, $name)"/>
  </xsl:function>

  <!-- The bones a segment stands for: those from its own to the next segment's. -->
  <xsl:function name="sw:bones" as="xs:string">
    <xsl:param name="segment" as="element(m:segment)"/>
    <xsl:variable name="bones" select="('shank', 'tibia and fibula'), ('hindfoot', 'talus and calcaneus'),
        ('midfoot', 'navicular, cuboid and cuneiforms'), ('forefoot', 'metatarsals'), ('phalanx_1', 'first phalanges'),
        ('phalanx_2', 'second phalanges'), ('phalanx_3', 'third phalanges'), ('', '')"/>
    <xsl:variable name="order" select="for $i in 1 to count($bones) idiv 2 return $bones[2 * $i - 1]"/>
    <xsl:variable name="own" select="sw:rank($order, $segment/@name)"/>
    <xsl:variable name="next" select="$segment/following-sibling::m:segment[1]/@name"/>
    <xsl:variable name="end" select="if (exists($next)) then sw:rank($order, $next) else count($order)"/>
    <!-- Before a joint between hindfoot and forefoot, what lies between moves with the forefoot. -->
    <xsl:variable name="start" select="if ($segment/@name = 'forefoot' and $segment/@parent = 'hindfoot') then sw:rank($order, 'midfoot') else $own"/>
    <xsl:variable name="stop" select="if ($segment/@name = 'hindfoot' and $next = 'forefoot') then sw:rank($order, 'midfoot') else $end"/>
    <xsl:sequence select="string-join(for $i in $start to $stop - 1 return $bones[2 * $i], ', ')"/>
  </xsl:function>

  <xsl:function name="sw:rank" as="xs:integer">
    <xsl:param name="order" as="xs:string*"/>
    <xsl:param name="name" as="xs:string"/>
    <xsl:sequence select="index-of($order, if ($name = 'foot') then 'hindfoot' else if ($name = 'toes') then 'phalanx_1' else $name)"/>
  </xsl:function>

  <!-- A text as one string of X3D's lists of strings. -->
  <xsl:function name="sw:text" as="xs:string">
    <xsl:param name="text" as="xs:string"/>
    <xsl:sequence select="concat('&quot;', replace(replace($text, '\\', '\\\\'), '&quot;', '\\&quot;'), '&quot;')"/>
  </xsl:function>

  <xsl:function name="sw:string">
    <xsl:param name="name" as="xs:string"/>
    <xsl:param name="text"/>
    <xsl:if test="exists($text)">
      <MetadataString name="{$name}" value="{sw:text(string($text))}"/>
    </xsl:if>
  </xsl:function>

  <xsl:function name="sw:double">
    <xsl:param name="name" as="xs:string"/>
    <xsl:param name="values"/>
    <xsl:if test="exists($values)">
      <MetadataDouble name="{$name}" value="{sw:numbers($values ! xs:double(.))}"/>
    </xsl:if>
  </xsl:function>

  <xsl:template match="/m:footModel">
    <xsl:variable name="known" select="$chain/j/tokenize(@of, ' ')"/>
    <xsl:if test="exists(m:segments/m:segment[not(@name = $known)]) or (some $j in $chain/j satisfies
        count($model/m:segments/m:segment[@name = tokenize($j/@of, ' ')]) > 1 or count($model/m:joints/m:joint[sw:role(.) = $j/@name]) > 1)">
      <xsl:message terminate="yes">HAnim's leg ends with three phalanges and has no place for the chain <xsl:value-of
          select="m:segments/m:segment/@name" separator=", "/>; the template urdf has</xsl:message>
    </xsl:if>
    <xsl:if test="m:settings/m:setting[@name = 'zero' and @value = 'flat']">
      <xsl:message>the ranges of joint angles count from foot flat, the places from standing: shift the limits by the difference</xsl:message>
    </xsl:if>
    <X3D profile="Immersive" version="4.0">
      <head>
        <component name="HAnim" level="1"/>
        <meta name="title" content="Foot model of subject {m:subject/@id}, {@side} side"/>
        <meta name="generator" content="Solewright {@version}"/>
        <xsl:for-each select="m:cautions/m:caution">
          <meta name="warning" content="{.}"/>
        </xsl:for-each>
      </head>
      <Scene>
        <WorldInfo title="Foot model of subject {m:subject/@id}, {@side} side"
            info="{string-join(('x to the left, y up, z forward; m, kg, rad; standing posture', m:cautions/m:caution) ! sw:text(.), ' ')}"/>
        <HAnimHumanoid DEF="hanim" name="foot_model_{@side}" version="2.0" loa="4">
          <xsl:call-template name="humanoid-metadata"/>
          <xsl:apply-templates select="$used[1]"/>
          <xsl:for-each select="$used">
            <HAnimJoint USE="hanim_{sw:name(@name)}" containerField="joints"/>
          </xsl:for-each>
          <xsl:for-each select="$used[exists(sw:segment(.))]">
            <HAnimSegment USE="hanim_{sw:name(@segment)}" containerField="segments"/>
          </xsl:for-each>
        </HAnimHumanoid>
      </Scene>
    </X3D>
  </xsl:template>

  <xsl:template match="j">
    <xsl:variable name="joint" select="sw:joint(.)"/>
    <xsl:variable name="isRigid" select="empty($joint) and not(@name = ('humanoid_root', 'sacroiliac', 'hip', 'knee'))"/>
    <HAnimJoint DEF="hanim_{sw:name(@name)}" name="{sw:name(@name)}" center="{sw:numbers(sw:centre(.))}"
        containerField="{if (@name = 'humanoid_root') then 'skeleton' else 'children'}">
      <xsl:if test="$isRigid">
        <xsl:attribute name="llimit" select="'0 0 0'"/>
        <xsl:attribute name="ulimit" select="'0 0 0'"/>
      </xsl:if>
      <xsl:choose>
        <xsl:when test="@name = ('humanoid_root', 'sacroiliac', 'hip')">
          <MetadataSet containerField="metadata" name="joint">
            <xsl:sequence select="sw:string('centre', 'put one limb length above the floor over the knee: the model ends at the knee'),
                sw:string('centre_basis', 'assumed')"/>
          </MetadataSet>
        </xsl:when>
        <xsl:when test="exists($joint)"><xsl:apply-templates select="$joint"/></xsl:when>
        <xsl:when test="$isRigid">
          <MetadataSet containerField="metadata" name="joint">
            <xsl:sequence select="sw:string('kind', 'rigid: the model has no joint here'), sw:string('centre_basis', 'assumed')"/>
          </MetadataSet>
        </xsl:when>
      </xsl:choose>
      <xsl:if test="exists(sw:segment(.))">
        <xsl:apply-templates select="sw:segment(.)">
          <xsl:with-param name="j" select="."/>
        </xsl:apply-templates>
      </xsl:if>
      <xsl:apply-templates select="following-sibling::j[1][. intersect $used]"/>
    </HAnimJoint>
  </xsl:template>

  <xsl:template match="m:joint">
    <MetadataSet containerField="metadata" name="joint">
      <xsl:sequence select="sw:string('name', @name), sw:string('proximal', @proximal), sw:string('distal', @distal), sw:string('kind', @kind),
          sw:string('centre_basis', m:centre/@basis), sw:double('centre_sd_m', m:centre/@sd)"/>
      <xsl:for-each select="m:axis">
        <xsl:variable name="n" select="concat('axis_', position())"/>
        <xsl:sequence select="sw:string(concat($n, '_name'), @name), sw:double($n, sw:turn($axes, sw:vector(.))),
            sw:string(concat($n, '_basis'), @basis), sw:string(concat($n, '_source'), @source), sw:double(concat($n, '_sd_rad'), @sd)"/>
      </xsl:for-each>
      <xsl:for-each select="m:range">
        <xsl:sequence select="sw:double('range_of_axis_1_rad', (@min, @max)), sw:string('range_basis', @basis)"/>
      </xsl:for-each>
      <xsl:for-each select="m:lock">
        <xsl:sequence select="sw:double('lock_angle_rad', @angle), sw:double('lock_percent_of_stance', @stancePercent), sw:string('lock_basis', @basis)"/>
      </xsl:for-each>
    </MetadataSet>
  </xsl:template>

  <xsl:template match="m:segment">
    <xsl:param name="j" as="element(j)"/>
    <xsl:variable name="s" select="."/>
    <HAnimSegment DEF="hanim_{sw:name($j/@segment)}" name="{sw:name($j/@segment)}" mass="{m:mass/@value}"
        centerOfMass="{sw:numbers(sw:place(@name, sw:vector(m:centreOfMass)))}" momentsOfInertia="{sw:numbers(sw:tensor($axes, m:inertia))}">
      <MetadataSet containerField="metadata" name="segment">
        <xsl:sequence select="sw:string('name', @name), sw:string('stands_for',
              sw:bones(.)),
            sw:string('observed', @observed), sw:double('origin', sw:place(@name, (0e0, 0e0, 0e0))),
            sw:string('mass_basis', m:mass/@basis), sw:double('mass_sd_kg', m:mass/@sd),
            sw:string('centre_of_mass_basis', m:centreOfMass/@basis), sw:double('centre_of_mass_sd_m', m:centreOfMass/@sd),
            sw:string('inertia_basis', m:inertia/@basis),
            sw:double('length_m', m:length/@value), sw:string('length_basis', m:length/@basis), sw:double('length_sd_m', m:length/@sd)"/>
        <xsl:for-each select="$model/m:contacts/m:pad[@segment = $s/@name]">
          <MetadataSet name="pad">
            <xsl:sequence select="sw:string('name', @name), sw:double('centre_m', sw:place(@segment, sw:vector(.))), sw:double('radius_m', @radius),
                sw:double('stiffness_N_per_m_to_1.5', @stiffness), sw:double('damping_s_per_m', @damping), sw:double('friction', @friction),
                sw:string('basis', @basis)"/>
          </MetadataSet>
        </xsl:for-each>
        <xsl:for-each select="$model/m:landmarks/m:landmark[@segment = $s/@name]">
          <MetadataSet name="landmark">
            <xsl:sequence select="sw:string('name', @name), sw:double('place_m', sw:place(@segment, sw:vector(.)))"/>
          </MetadataSet>
        </xsl:for-each>
      </MetadataSet>
    </HAnimSegment>
  </xsl:template>

  <xsl:template name="humanoid-metadata">
    <MetadataSet containerField="metadata" name="foot_model">
      <xsl:for-each select="m:subject">
        <xsl:variable name="s" select="."/>
        <MetadataSet name="subject">
          <xsl:sequence select="sw:string('id', @id), sw:string('population', @population), sw:string('sex', @sex)"/>
          <xsl:for-each select="'mass', 'stature', 'limbLength', 'footLength', 'effectiveFootLength'">
            <xsl:variable name="n" select="."/>
            <xsl:sequence select="sw:double(concat($n, if ($n = 'mass') then '_kg' else '_m'), $s/@*[local-name() = $n]),
                sw:string(concat($n, '_basis'), $s/@*[local-name() = concat($n, 'Basis')]),
                sw:double(concat($n, if ($n = 'mass') then '_sd_kg' else '_sd_m'), $s/@*[local-name() = concat($n, 'Sd')])"/>
          </xsl:for-each>
        </MetadataSet>
      </xsl:for-each>
      <xsl:for-each select="m:rolling/m:arc">
        <MetadataSet name="arc">
          <xsl:sequence select="sw:string('frame', @frame), sw:double('curvature_per_m', @curvature), sw:double('curvature_sd_per_m', @curvatureSd),
              sw:double('radius_m', @radius[. != 'INF']), sw:double('radius_sd_m', @radiusSd), sw:double('centre_forward_m', @centreX),
              sw:double('centre_up_m', @centreY), sw:double('arc_length_m', @arcLength), sw:double('rms_m', @rms), sw:double('steps', @steps),
              sw:string('basis', @basis)"/>
        </MetadataSet>
      </xsl:for-each>
      <xsl:for-each select="m:rolling/m:outline[m:point]">
        <MetadataSet name="outline">
          <xsl:sequence select="sw:double('forward_and_up_in_the_foot_frame_m', m:point/(@x, @y)), sw:string('basis', 'measured')"/>
        </MetadataSet>
      </xsl:for-each>
      <xsl:for-each select="m:rolling/m:pivots/m:pivot">
        <MetadataSet name="pivot">
          <xsl:sequence select="sw:double('along_the_sole_from_the_heel_m', @position), sw:double('height_m', @height),
              sw:double('from_percent_of_stance', @from), sw:double('to_percent_of_stance', @to), sw:string('basis', 'measured')"/>
        </MetadataSet>
      </xsl:for-each>
      <xsl:for-each select="m:rolling/m:cap">
        <MetadataSet name="cap">
          <xsl:sequence select="sw:double('radius_m', @radius), sw:double('centre_in_the_knee_frame_m', sw:turn($axes, (@centreX, @centreY, @centreZ) ! xs:double(.))),
              sw:double('rms_m', @rms), sw:string('basis', 'measured')"/>
        </MetadataSet>
      </xsl:for-each>
      <xsl:for-each select="m:sources/m:file">
        <MetadataSet name="source">
          <xsl:sequence select="sw:string('role', @role), sw:string('path', @path), sw:string('sha256', @sha256)"/>
        </MetadataSet>
      </xsl:for-each>
      <xsl:for-each select="m:settings/m:setting">
        <MetadataSet name="setting">
          <xsl:sequence select="sw:string('name', @name), sw:string('value', @value)"/>
        </MetadataSet>
      </xsl:for-each>
      <xsl:for-each select="m:findings/m:finding">
        <MetadataSet name="finding">
          <xsl:sequence select="sw:string('code', @code), sw:string('severity', @severity), sw:string('where', @where), sw:string('text', .)"/>
        </MetadataSet>
      </xsl:for-each>
      <xsl:for-each select="m:cautions/m:caution">
        <xsl:sequence select="sw:string('caution', .)"/>
      </xsl:for-each>
    </MetadataSet>
  </xsl:template>
</xsl:stylesheet>
