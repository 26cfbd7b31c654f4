<?xml version="1.0" encoding="UTF-8"?>
<!-- Every parameter of a foot model as one row of a table (RFC 4180), version 1. -->
<xsl:stylesheet version="3.0" xmlns:xsl="http://www.w3.org/1999/XSL/Transform" xmlns:xs="http://www.w3.org/2001/XMLSchema"
    xmlns:m="urn:solewright:foot-model:1" xmlns:sw="urn:solewright:functions:1" exclude-result-prefixes="#all">

  <xsl:import href="solewright:functions.xsl"/>
  <xsl:output method="text" encoding="UTF-8"/>

  <xsl:function name="sw:row" as="xs:string">
    <xsl:param name="name"/>
    <xsl:param name="value"/>
    <xsl:param name="unit"/>
    <xsl:param name="basis"/>
    <xsl:param name="sd"/>
    <xsl:param name="frame"/>
    <xsl:sequence select="concat(string-join(for $c in (string($name), string($value), string($unit), string($basis),
        string($sd), string($frame)) return sw:cell($c), ','), '&#10;')"/>
  </xsl:function>

  <!-- The attributes named, each with the basis and sd that stand beside it. -->
  <xsl:function name="sw:rows" as="xs:string*">
    <xsl:param name="prefix" as="xs:string"/>
    <xsl:param name="element" as="element()"/>
    <xsl:param name="names" as="xs:string*"/>
    <xsl:param name="unit" as="xs:string"/>
    <xsl:param name="frame" as="xs:string"/>
    <xsl:sequence select="for $n in $names, $a in $element/@*[local-name() = $n]
        return sw:row(concat($prefix, '.', $n), $a, $unit, $element/@basis, $element/@sd, $frame)"/>
  </xsl:function>

  <xsl:template match="/m:footModel">
    <xsl:text>parameter,value,unit,basis,sd,frame&#10;</xsl:text>
    <xsl:for-each select="m:cautions/m:caution">
      <xsl:value-of select="sw:row(concat('caution.', position()), ., '', '', '', '')"/>
    </xsl:for-each>
    <xsl:value-of select="sw:row('model.side', @side, '', '', '', ''), sw:row('model.version', @version, '', '', '', '')"
        separator=""/>
    <xsl:apply-templates select="m:subject, m:sources, m:settings/*, m:segments/*, m:joints/*, m:landmarks/*, m:rolling, m:contacts/*, m:findings/*"/>
  </xsl:template>

  <xsl:template match="m:subject">
    <xsl:variable name="s" select="."/>
    <xsl:value-of select="sw:row('subject.id', @id, '', '', '', ''), sw:row('subject.population', @population, '', '', '', ''),
        for $a in @sex return sw:row('subject.sex', $a, '', '', '', '')" separator=""/>
    <xsl:for-each select="'mass', 'stature', 'limbLength', 'footLength', 'effectiveFootLength'">
      <xsl:variable name="n" select="."/>
      <xsl:value-of select="for $a in $s/@*[local-name() = $n] return sw:row(concat('subject.', $n), $a,
          if ($n = 'mass') then 'kg' else 'm', $s/@*[local-name() = concat($n, 'Basis')], $s/@*[local-name() = concat($n, 'Sd')], '')"/>
    </xsl:for-each>
  </xsl:template>

  <xsl:template match="m:sources">
    <xsl:for-each select="m:file">
      <xsl:variable name="name" select="concat('source.', position(), '.')"/>
      <xsl:value-of select="sw:row(concat($name, 'role'), @role, '', '', '', ''), sw:row(concat($name, 'path'), @path, '', '', '', ''),
          sw:row(concat($name, 'sha256'), @sha256, '', '', '', '')" separator=""/>
    </xsl:for-each>
  </xsl:template>

  <xsl:template match="m:setting">
    <xsl:value-of select="sw:row(concat('setting.', @name), @value, '', '', '', '')"/>
  </xsl:template>

  <xsl:template match="m:segment">
    <xsl:variable name="p" select="concat('segment.', @name)"/>
    <xsl:value-of select="for $a in @parent return sw:row(concat($p, '.parent'), $a, '', '', '', ''),
        for $a in @observed return sw:row(concat($p, '.observed'), $a, '', '', '', ''),
        sw:row(concat($p, '.mass'), m:mass/@value, 'kg', m:mass/@basis, m:mass/@sd, ''),
        sw:row(concat($p, '.length'), m:length/@value, 'm', m:length/@basis, m:length/@sd, ''),
        sw:rows(concat($p, '.centreOfMass'), m:centreOfMass, ('x', 'y', 'z'), 'm', @name),
        sw:rows(concat($p, '.inertia'), m:inertia, ('xx', 'yy', 'zz', 'xy', 'xz', 'yz'), 'kg m2', concat(@name, ', about its centre of mass'))"
        separator=""/>
  </xsl:template>

  <xsl:template match="m:joint">
    <xsl:variable name="j" select="."/>
    <xsl:variable name="p" select="concat('joint.', @name)"/>
    <xsl:value-of select="sw:row(concat($p, '.kind'), @kind, '', '', '', ''), sw:row(concat($p, '.proximal'), @proximal, '', '', '', ''),
        sw:row(concat($p, '.distal'), @distal, '', '', '', ''),
        sw:rows(concat($p, '.centre'), m:centre, ('x', 'y', 'z'), 'm', @proximal),
        for $a in m:axis return (sw:rows(concat($p, '.axis.', $a/@name), $a, ('x', 'y', 'z'), '1', $j/@proximal),
            for $s in $a/@source return sw:row(concat($p, '.axis.', $a/@name, '.source'), $s, '', '', '', '')),
        for $r in m:range return sw:rows(concat($p, '.range'), $r, ('min', 'max'), 'rad', ''),
        for $l in m:lock return (sw:rows(concat($p, '.lock'), $l, 'angle', 'rad', ''), sw:rows(concat($p, '.lock'), $l, 'stancePercent', '%', ''))"
        separator=""/>
  </xsl:template>

  <xsl:template match="m:landmark">
    <xsl:variable name="l" select="."/>
    <xsl:value-of select="for $a in (@x, @y, @z)
        return sw:row(concat('landmark.', $l/@name, '.', local-name($a)), $a, 'm', 'measured', '', $l/@segment)" separator=""/>
  </xsl:template>

  <xsl:template match="m:rolling">
    <xsl:for-each select="m:arc">
      <xsl:variable name="p" select="concat('rolling.arc.', @frame)"/>
      <xsl:value-of select="sw:row(concat($p, '.radius'), @radius, 'm', @basis, @radiusSd, @frame),
          sw:row(concat($p, '.curvature'), @curvature, '1/m', @basis, @curvatureSd, @frame),
          sw:rows($p, ., ('centreX', 'centreY', 'arcLength', 'rms'), 'm', @frame), sw:rows($p, ., 'steps', '1', '')" separator=""/>
    </xsl:for-each>
    <xsl:for-each select="m:outline/m:point">
      <xsl:variable name="p" select="concat('rolling.outline.', position())"/>
      <xsl:value-of select="sw:row(concat($p, '.x'), @x, 'm', 'measured', '', 'foot'), sw:row(concat($p, '.y'), @y, 'm', 'measured', '', 'foot')"
          separator=""/>
    </xsl:for-each>
    <xsl:for-each select="m:pivots/m:pivot">
      <xsl:variable name="p" select="concat('rolling.pivot.', position())"/>
      <xsl:value-of select="sw:row(concat($p, '.position'), @position, 'm', 'measured', '', 'along the sole from the heel'),
          sw:row(concat($p, '.height'), @height, 'm', 'measured', '', 'above the plane of the sole'),
          sw:row(concat($p, '.from'), @from, '% of stance', 'measured', '', ''), sw:row(concat($p, '.to'), @to, '% of stance', 'measured', '', '')"
          separator=""/>
    </xsl:for-each>
    <xsl:for-each select="m:cap">
      <xsl:variable name="c" select="."/>
      <xsl:value-of select="for $a in (@radius, @centreX, @centreY, @centreZ, @rms)
          return sw:row(concat('rolling.cap.', local-name($a)), $a, 'm', 'measured', '', 'knee')" separator=""/>
    </xsl:for-each>
  </xsl:template>

  <xsl:template match="m:pad">
    <xsl:variable name="p" select="concat('pad.', @name)"/>
    <xsl:value-of select="sw:row(concat($p, '.segment'), @segment, '', '', '', ''), sw:rows($p, ., ('x', 'y', 'z'), 'm', @segment),
        sw:rows($p, ., 'radius', 'm', ''), sw:rows($p, ., 'stiffness', 'N/m^1.5', ''), sw:rows($p, ., 'damping', 's/m', ''),
        sw:rows($p, ., 'friction', '1', '')" separator=""/>
  </xsl:template>

  <xsl:template match="m:finding">
    <xsl:value-of select="sw:row(concat('finding.', position(), '.', @severity, '.', @code),
        if (@where) then concat(@where, ': ', .) else string(.), '', '', '', '')"/>
  </xsl:template>
</xsl:stylesheet>
