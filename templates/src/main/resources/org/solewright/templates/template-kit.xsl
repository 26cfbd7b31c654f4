<?xml version="1.0" encoding="UTF-8"?>
<!-- A template to start from, version 1: copy it, give the copy a name of your own, change what it writes, and give
     its file to the export command as the template. The page that explains it is README.md in the folder templates. -->
<xsl:stylesheet version="3.0"
    xmlns:xsl="http://www.w3.org/1999/XSL/Transform"
    xmlns:xs="http://www.w3.org/2001/XMLSchema"
    xmlns:m="urn:solewright:foot-model:1"
    xmlns:sw="urn:solewright:functions:1"
    exclude-result-prefixes="#all">

  <!-- Frames, tensors, units. The name is no file: it always means the functions of the installed version. -->
  <xsl:import href="solewright:functions.xsl"/>

  <!-- method="xml" or "json" for other platforms; indent keeps XML readable. -->
  <xsl:output method="text" encoding="UTF-8"/>

  <!-- 1. The axes your platform wants: model (x forward, y up, z right), z-up (x forward, y left, z up) or hanim. -->
  <xsl:variable name="axes" select="sw:frame('z-up')"/>

  <!-- 2. Everything starts at the model; all numbers in it are in SI units. -->
  <xsl:template match="/m:footModel">
    <xsl:text># foot model of subject </xsl:text>
    <xsl:value-of select="m:subject/@id"/>
    <xsl:text>, </xsl:text>
    <xsl:value-of select="@side"/>
    <xsl:text> side; mm, kg, kg mm2, deg; x forward, y left, z up&#10;</xsl:text>
    <!-- 3. The cautions stay in whatever you write. -->
    <xsl:for-each select="m:cautions/m:caution">
      <xsl:text># </xsl:text><xsl:value-of select="."/><xsl:text>&#10;</xsl:text>
    </xsl:for-each>
    <xsl:apply-templates select="m:segments/m:segment"/>
    <xsl:apply-templates select="m:joints/m:joint"/>
    <xsl:apply-templates select="m:contacts/m:pad"/>
  </xsl:template>

  <!-- 4. A segment: sw:turn turns a place, sw:tensor an inertia (nine values), sw:to changes the unit. -->
  <xsl:template match="m:segment">
    <xsl:variable name="com" select="sw:turn($axes, sw:vector(m:centreOfMass)) ! sw:to(., 'mm')"/>
    <xsl:variable name="inertia" select="sw:tensor($axes, m:inertia) ! sw:to(., 'kg mm2')"/>
    <xsl:value-of select="'segment', @name, 'mass', m:mass/@value, 'com', sw:numbers($com), 'inertia', sw:numbers($inertia)"
        separator=" "/>
    <xsl:text>&#10;</xsl:text>
  </xsl:template>

  <!-- 5. A joint: centre and axes are in the frame of its proximal segment; two axes turn one after the other. -->
  <xsl:template match="m:joint">
    <xsl:value-of select="'joint', @name, 'between', @proximal, 'and', @distal, 'centre',
        sw:numbers(sw:turn($axes, sw:vector(m:centre)) ! sw:to(., 'mm'))" separator=" "/>
    <xsl:for-each select="m:axis">
      <xsl:value-of select="' axis', @name, sw:numbers(sw:turn($axes, sw:vector(.)))" separator=" "/>
    </xsl:for-each>
    <xsl:if test="m:range">
      <xsl:value-of select="' range', sw:numbers((m:range/@min, m:range/@max) ! sw:to(xs:double(.), 'deg'))" separator=" "/>
    </xsl:if>
    <xsl:text>&#10;</xsl:text>
  </xsl:template>

  <!-- 6. A pad: a sphere with the force stiffness d^1.5 (1 + damping d'), never tensile. -->
  <xsl:template match="m:pad">
    <xsl:value-of select="'pad', @name, 'on', @segment, 'centre', sw:numbers(sw:turn($axes, sw:vector(.)) ! sw:to(., 'mm')),
        'radius', sw:to(@radius, 'mm'), 'stiffness', sw:to(@stiffness, 'N/mm^1.5')" separator=" "/>
    <xsl:text>&#10;</xsl:text>
  </xsl:template>
</xsl:stylesheet>
