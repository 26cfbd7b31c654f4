<?xml version="1.0" encoding="UTF-8"?>
<!-- A foot model as URDF, version 1: x forward, y left, z up; m, kg, rad; joint angles zero in the standing posture (or at foot flat, where the setting zero says so).
     A joint with several axes becomes as many revolute joints; the links between them carry the share 1e-9 of the distal
     segment, so that no link is without mass and the total is kept. -->
<xsl:stylesheet version="3.0" xmlns:xsl="http://www.w3.org/1999/XSL/Transform" xmlns:xs="http://www.w3.org/2001/XMLSchema"
    xmlns:m="urn:solewright:foot-model:1" xmlns:sw="urn:solewright:functions:1" xmlns:c="urn:solewright:urdf-constants:1"
    exclude-result-prefixes="xs m sw">

  <xsl:import href="solewright:functions.xsl"/>
  <xsl:output method="xml" indent="yes" encoding="UTF-8"/>

  <xsl:variable name="axes" select="sw:frame('z-up')"/>
  <xsl:variable name="share" select="1e-9"/>

  <xsl:template match="/m:footModel">
    <xsl:if test="m:settings/m:setting[@name = 'zero' and @value = 'flat']">
      <xsl:message>the ranges of joint angles count from foot flat, the places from standing: shift the limits by the difference</xsl:message>
    </xsl:if>
    <xsl:variable name="model" select="."/>
    <robot name="solewright_{@side}_foot">
      <xsl:comment>
        <xsl:for-each select="m:cautions/m:caution" expand-text="yes">&#10;  {replace(., '-+', '-')}</xsl:for-each>
        <xsl:text>&#10;  x forward, y left, z up; m, kg, rad; angles are zero in the standing posture, positive by the right-hand rule.</xsl:text>
        <xsl:text>&#10;  URDF demands effort and velocity of every limit; the model has none: the numbers here are high so as not to limit.&#10;</xsl:text>
      </xsl:comment>
      <xsl:for-each select="m:segments/m:segment">
        <xsl:variable name="joint" select="$model/m:joints/m:joint[@distal = current()/@name][1]"/>
        <xsl:variable name="between" select="if (empty($joint)) then 0 else count(sw:axes($joint)) - 1"/>
        <xsl:variable name="segment" select="."/>
        <xsl:for-each select="1 to $between">
          <link name="{sw:between($joint, .)}">
            <xsl:sequence select="sw:inertial($segment, $share)"/>
          </link>
        </xsl:for-each>
        <link name="{@name}">
          <xsl:sequence select="sw:inertial(., 1 - $between * $share)"/>
          <xsl:for-each select="$model/m:contacts/m:pad[@segment = $segment/@name]">
            <collision name="{@name}">
              <origin xyz="{sw:numbers(sw:turn($axes, sw:vector(.)))}" rpy="0 0 0"/>
              <geometry><sphere radius="{@radius}"/></geometry>
            </collision>
          </xsl:for-each>
        </link>
      </xsl:for-each>
      <xsl:apply-templates select="m:joints/m:joint"/>
      <c:constants>
        <xsl:apply-templates select="m:subject, m:settings/m:setting, m:segments/m:segment, m:joints/m:joint, m:landmarks/m:landmark, m:rolling, m:contacts/m:pad, m:findings/m:finding,
            m:cautions/m:caution" mode="constant"/>
      </c:constants>
    </robot>
  </xsl:template>

  <!-- Name and direction of each axis of a joint; a ball turns about forward, left and up, one after the other. -->
  <xsl:function name="sw:axes" as="element()*">
    <xsl:param name="joint" as="element(m:joint)"/>
    <xsl:choose>
      <xsl:when test="$joint/@kind = 'ball'">
        <m:axis name="forward" x="1" y="0" z="0"/>
        <m:axis name="left" x="0" y="0" z="-1"/>
        <m:axis name="up" x="0" y="1" z="0"/>
      </xsl:when>
      <xsl:otherwise><xsl:sequence select="$joint/m:axis"/></xsl:otherwise>
    </xsl:choose>
  </xsl:function>

  <xsl:function name="sw:between" as="xs:string">
    <xsl:param name="joint" as="element(m:joint)"/>
    <xsl:param name="number" as="xs:integer"/>
    <xsl:sequence select="concat($joint/@distal, '_after_', sw:axes($joint)[$number]/@name)"/>
  </xsl:function>

  <xsl:function name="sw:inertial" as="element()">
    <xsl:param name="segment" as="element(m:segment)"/>
    <xsl:param name="part" as="xs:double"/>
    <xsl:variable name="t" select="sw:tensor($axes, $segment/m:inertia) ! (. * $part)"/>
    <inertial>
      <origin xyz="{sw:numbers(sw:turn($axes, sw:vector($segment/m:centreOfMass)))}" rpy="0 0 0"/>
      <mass value="{$segment/m:mass/@value * $part}"/>
      <inertia ixx="{$t[1]}" ixy="{$t[2]}" ixz="{$t[3]}" iyy="{$t[5]}" iyz="{$t[6]}" izz="{$t[9]}"/>
    </inertial>
  </xsl:function>

  <xsl:template match="m:joint">
    <xsl:variable name="joint" select="."/>
    <xsl:variable name="all" select="sw:axes(.)"/>
    <xsl:for-each select="$all">
      <xsl:variable name="n" select="position()"/>
      <xsl:variable name="isLimited" select="$n = 1 and $joint/m:range and $joint/@kind != 'ball'"/>
      <joint name="{if (count($all) = 1) then $joint/@name else concat($joint/@name, '_', @name)}"
          type="{if ($isLimited) then 'revolute' else 'continuous'}">
        <parent link="{if ($n = 1) then $joint/@proximal else sw:between($joint, $n - 1)}"/>
        <child link="{if ($n = count($all)) then $joint/@distal else sw:between($joint, $n)}"/>
        <origin xyz="{if ($n = 1) then sw:numbers(sw:turn($axes, sw:vector($joint/m:centre))) else '0 0 0'}" rpy="0 0 0"/>
        <axis xyz="{sw:numbers(sw:turn($axes, sw:vector(.)))}"/>
        <xsl:if test="$isLimited">
          <limit lower="{$joint/m:range/@min}" upper="{$joint/m:range/@max}" effort="10000" velocity="1000"/>
        </xsl:if>
      </joint>
    </xsl:for-each>
  </xsl:template>

  <!-- What URDF cannot hold: named constants, SI units, vectors in the axes of this file. -->
  <xsl:template name="constant">
    <xsl:param name="name"/>
    <xsl:param name="value"/>
    <xsl:param name="unit" select="''"/>
    <xsl:param name="basis" select="''"/>
    <xsl:param name="sd" select="''"/>
    <c:constant name="{$name}" value="{$value}">
      <xsl:if test="$unit != ''"><xsl:attribute name="unit" select="$unit"/></xsl:if>
      <xsl:if test="$basis != ''"><xsl:attribute name="basis" select="$basis"/></xsl:if>
      <xsl:if test="$sd != ''"><xsl:attribute name="sd" select="$sd"/></xsl:if>
    </c:constant>
  </xsl:template>

  <xsl:template match="m:subject" mode="constant">
    <xsl:variable name="s" select="."/>
    <xsl:for-each select="'mass', 'stature', 'limbLength', 'footLength', 'effectiveFootLength'">
      <xsl:variable name="n" select="."/>
      <xsl:if test="$s/@*[local-name() = $n]">
        <xsl:call-template name="constant">
          <xsl:with-param name="name" select="concat('subject.', $n)"/>
          <xsl:with-param name="value" select="$s/@*[local-name() = $n]"/>
          <xsl:with-param name="unit" select="if ($n = 'mass') then 'kg' else 'm'"/>
          <xsl:with-param name="basis" select="string($s/@*[local-name() = concat($n, 'Basis')])"/>
          <xsl:with-param name="sd" select="string($s/@*[local-name() = concat($n, 'Sd')])"/>
        </xsl:call-template>
      </xsl:if>
    </xsl:for-each>
  </xsl:template>

  <xsl:template match="m:setting" mode="constant">
    <xsl:call-template name="constant">
      <xsl:with-param name="name" select="concat('setting.', @name)"/>
      <xsl:with-param name="value" select="@value"/>
    </xsl:call-template>
  </xsl:template>

  <xsl:template match="m:segment" mode="constant">
    <xsl:variable name="s" select="."/>
    <xsl:for-each select="m:mass, m:length, m:centreOfMass, m:inertia">
      <xsl:call-template name="constant">
        <xsl:with-param name="name" select="concat($s/@name, '.', local-name())"/>
        <xsl:with-param name="value" select="if (@value) then string(@value)
            else if (self::m:inertia) then sw:numbers(sw:tensor($axes, .)) else sw:numbers(sw:turn($axes, sw:vector(.)))"/>
        <xsl:with-param name="unit" select="if (self::m:mass) then 'kg' else if (self::m:inertia) then 'kg m2' else 'm'"/>
        <xsl:with-param name="basis" select="string(@basis)"/>
        <xsl:with-param name="sd" select="string(@sd)"/>
      </xsl:call-template>
    </xsl:for-each>
  </xsl:template>

  <xsl:template match="m:joint" mode="constant">
    <xsl:variable name="j" select="."/>
    <xsl:call-template name="constant">
      <xsl:with-param name="name" select="concat(@name, '.kind')"/>
      <xsl:with-param name="value" select="@kind"/>
    </xsl:call-template>
    <xsl:for-each select="m:centre, m:axis">
      <xsl:call-template name="constant">
        <xsl:with-param name="name" select="concat($j/@name, '.', if (self::m:centre) then 'centre' else concat('axis.', @name))"/>
        <xsl:with-param name="value" select="sw:numbers(sw:turn($axes, sw:vector(.)))"/>
        <xsl:with-param name="unit" select="if (self::m:centre) then 'm' else '1'"/>
        <xsl:with-param name="basis" select="string(@basis)"/>
        <xsl:with-param name="sd" select="string(@sd)"/>
      </xsl:call-template>
    </xsl:for-each>
    <xsl:for-each select="m:axis/@source">
      <xsl:call-template name="constant">
        <xsl:with-param name="name" select="concat($j/@name, '.axis.', ../@name, '.source')"/>
        <xsl:with-param name="value" select="."/>
      </xsl:call-template>
    </xsl:for-each>
    <xsl:for-each select="m:range/(@min, @max), m:lock/(@angle, @stancePercent)">
      <xsl:call-template name="constant">
        <xsl:with-param name="name" select="concat($j/@name, '.', local-name(..), '.', local-name())"/>
        <xsl:with-param name="value" select="."/>
        <xsl:with-param name="unit" select="if (local-name() = 'stancePercent') then '%' else 'rad'"/>
        <xsl:with-param name="basis" select="string(../@basis)"/>
      </xsl:call-template>
    </xsl:for-each>
  </xsl:template>

  <xsl:template match="m:landmark" mode="constant">
    <xsl:call-template name="constant">
      <xsl:with-param name="name" select="concat(@segment, '.landmark.', @name)"/>
      <xsl:with-param name="value" select="sw:numbers(sw:turn($axes, sw:vector(.)))"/>
      <xsl:with-param name="unit" select="'m'"/>
      <xsl:with-param name="basis" select="'measured'"/>
    </xsl:call-template>
  </xsl:template>

  <xsl:template match="m:rolling" mode="constant">
    <xsl:for-each select="m:arc">
      <xsl:variable name="arc" select="."/>
      <xsl:for-each select="@radius, @curvature, @centreX, @centreY, @arcLength, @rms, @steps">
        <xsl:call-template name="constant">
          <xsl:with-param name="name" select="concat('rolling.arc.', $arc/@frame, '.', local-name())"/>
          <xsl:with-param name="value" select="."/>
          <xsl:with-param name="unit" select="if (local-name() = 'curvature') then '1/m' else if (local-name() = 'steps') then '1' else 'm'"/>
          <xsl:with-param name="basis" select="string($arc/@basis)"/>
          <xsl:with-param name="sd" select="string($arc/@*[local-name() = concat(local-name(current()), 'Sd')])"/>
        </xsl:call-template>
      </xsl:for-each>
    </xsl:for-each>
    <xsl:if test="m:outline/m:point">
      <xsl:call-template name="constant">
        <xsl:with-param name="name" select="'rolling.outline'"/>
        <xsl:with-param name="value" select="m:outline/m:point/concat(@x, ' ', @y)"/>
        <xsl:with-param name="unit" select="'m forward, m up'"/>
        <xsl:with-param name="basis" select="'measured'"/>
      </xsl:call-template>
    </xsl:if>
    <xsl:for-each select="m:pivots/m:pivot">
      <xsl:variable name="n" select="position()"/>
      <xsl:for-each select="@position, @height, @from, @to">
        <xsl:call-template name="constant">
          <xsl:with-param name="name" select="concat('rolling.pivot.', $n, '.', local-name())"/>
          <xsl:with-param name="value" select="."/>
          <xsl:with-param name="unit" select="if (local-name() = ('from', 'to')) then '% of stance' else 'm'"/>
          <xsl:with-param name="basis" select="'measured'"/>
        </xsl:call-template>
      </xsl:for-each>
    </xsl:for-each>
    <xsl:for-each select="m:cap">
      <xsl:call-template name="constant">
        <xsl:with-param name="name" select="'rolling.cap.radius'"/>
        <xsl:with-param name="value" select="@radius"/>
        <xsl:with-param name="unit" select="'m'"/>
        <xsl:with-param name="basis" select="'measured'"/>
      </xsl:call-template>
      <xsl:call-template name="constant">
        <xsl:with-param name="name" select="'rolling.cap.centre'"/>
        <xsl:with-param name="value" select="sw:numbers(sw:turn($axes, (@centreX, @centreY, @centreZ) ! xs:double(.)))"/>
        <xsl:with-param name="unit" select="'m'"/>
        <xsl:with-param name="basis" select="'measured'"/>
      </xsl:call-template>
    </xsl:for-each>
  </xsl:template>

  <xsl:template match="m:pad" mode="constant">
    <xsl:variable name="pad" select="."/>
    <xsl:for-each select="@stiffness, @damping, @friction">
      <xsl:call-template name="constant">
        <xsl:with-param name="name" select="concat('pad.', $pad/@name, '.', local-name())"/>
        <xsl:with-param name="value" select="."/>
        <xsl:with-param name="unit" select="if (local-name() = 'stiffness') then 'N/m^1.5' else if (local-name() = 'damping') then 's/m' else '1'"/>
        <xsl:with-param name="basis" select="string($pad/@basis)"/>
      </xsl:call-template>
    </xsl:for-each>
  </xsl:template>

  <xsl:template match="m:finding" mode="constant">
    <xsl:call-template name="constant">
      <xsl:with-param name="name" select="concat('finding.', @severity, '.', @code)"/>
      <xsl:with-param name="value" select="if (@where) then concat(@where, ': ', .) else string(.)"/>
    </xsl:call-template>
  </xsl:template>

  <xsl:template match="m:caution" mode="constant">
    <xsl:call-template name="constant">
      <xsl:with-param name="name" select="'caution'"/>
      <xsl:with-param name="value" select="string(.)"/>
    </xsl:call-template>
  </xsl:template>
</xsl:stylesheet>
