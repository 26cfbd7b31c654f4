<?xml version="1.0" encoding="UTF-8"?>
<!-- Functions for templates, version 1. Import them with <xsl:import href="solewright:functions.xsl"/>.
     A vector is a sequence of three doubles, a rotation or tensor one of nine, row by row. -->
<xsl:stylesheet version="3.0" xmlns:xsl="http://www.w3.org/1999/XSL/Transform" xmlns:xs="http://www.w3.org/2001/XMLSchema"
    xmlns:m="urn:solewright:foot-model:1" xmlns:sw="urn:solewright:functions:1" exclude-result-prefixes="#all">

  <!-- Rotation from the model's axes (x forward, y up, z right) to those of a named frame: model; z-up (x forward, y left,
       z up); hanim (x to the left, y up, z forward). -->
  <xsl:function name="sw:frame" as="xs:double*">
    <xsl:param name="name" as="xs:string"/>
    <xsl:choose>
      <xsl:when test="$name = 'model'"><xsl:sequence select="1e0, 0e0, 0e0, 0e0, 1e0, 0e0, 0e0, 0e0, 1e0"/></xsl:when>
      <xsl:when test="$name = 'z-up'"><xsl:sequence select="1e0, 0e0, 0e0, 0e0, 0e0, -1e0, 0e0, 1e0, 0e0"/></xsl:when>
      <xsl:when test="$name = 'hanim'"><xsl:sequence select="0e0, 0e0, -1e0, 0e0, 1e0, 0e0, 1e0, 0e0, 0e0"/></xsl:when>
      <xsl:otherwise>
        <xsl:message terminate="yes">sw:frame: unknown frame '<xsl:value-of select="$name"/>', expected model, z-up or hanim</xsl:message>
      </xsl:otherwise>
    </xsl:choose>
  </xsl:function>

  <!-- The vector of an element with attributes x, y, z. -->
  <xsl:function name="sw:vector" as="xs:double*">
    <xsl:param name="place" as="element()"/>
    <xsl:sequence select="xs:double($place/@x), xs:double($place/@y), xs:double($place/@z)"/>
  </xsl:function>

  <!-- A vector in the axes of another frame; adding zero makes 0 of -0. -->
  <xsl:function name="sw:turn" as="xs:double*">
    <xsl:param name="rotation" as="xs:double*"/>
    <xsl:param name="vector" as="xs:double*"/>
    <xsl:sequence select="for $i in 0 to 2 return
        0e0 + $rotation[3 * $i + 1] * $vector[1] + $rotation[3 * $i + 2] * $vector[2] + $rotation[3 * $i + 3] * $vector[3]"/>
  </xsl:function>

  <!-- Sum of two vectors. -->
  <xsl:function name="sw:plus" as="xs:double*">
    <xsl:param name="a" as="xs:double*"/>
    <xsl:param name="b" as="xs:double*"/>
    <xsl:sequence select="for $i in 1 to 3 return $a[$i] + $b[$i]"/>
  </xsl:function>

  <!-- The nine values of an inertia element in the axes of another frame, about the same point. -->
  <xsl:function name="sw:tensor" as="xs:double*">
    <xsl:param name="rotation" as="xs:double*"/>
    <xsl:param name="inertia" as="element()"/>
    <xsl:variable name="t" as="xs:double*" select="for $a in ('xx', 'xy', 'xz', 'xy', 'yy', 'yz', 'xz', 'yz', 'zz')
        return xs:double($inertia/@*[local-name() = $a])"/>
    <xsl:sequence select="for $i in 0 to 2, $j in 0 to 2 return
        0e0 + sum(for $k in 0 to 2, $l in 0 to 2 return
            $rotation[3 * $i + $k + 1] * $t[3 * $k + $l + 1] * $rotation[3 * $j + $l + 1])"/>
  </xsl:function>

  <!-- Origin of a segment's frame from that of the first segment, m, in the model's axes, in the standing posture (there
       the axes of all segments are parallel). -->
  <xsl:function name="sw:offset" as="xs:double*">
    <xsl:param name="model" as="element(m:footModel)"/>
    <xsl:param name="segment" as="xs:string"/>
    <xsl:variable name="joint" select="$model/m:joints/m:joint[@distal = $segment][1]"/>
    <xsl:sequence select="if (empty($joint)) then (0e0, 0e0, 0e0)
        else sw:plus(sw:offset($model, $joint/@proximal), sw:vector($joint/m:centre))"/>
  </xsl:function>

  <!-- A value times the factor from an SI unit to another: m to cm or mm, kg to g, rad to deg, N/m^1.5 to N/mm^1.5,
       kg m2 to kg mm2, s/m to s/mm. -->
  <xsl:function name="sw:to" as="xs:double">
    <xsl:param name="value" as="xs:double"/>
    <xsl:param name="unit" as="xs:string"/>
    <xsl:variable name="factors" select="map { 'm': 1e0, 'cm': 1e2, 'mm': 1e3, 'kg': 1e0, 'g': 1e3, 'rad': 1e0,
        'deg': 57.29577951308232e0, 'N/m^1.5': 1e0, 'N/mm^1.5': 3.1622776601683795e-5, 'kg m2': 1e0, 'kg mm2': 1e6,
        's/m': 1e0, 's/mm': 1e-3 }"/>
    <xsl:if test="not(map:contains($factors, $unit))" xmlns:map="http://www.w3.org/2005/xpath-functions/map">
      <xsl:message terminate="yes">sw:to: unknown unit '<xsl:value-of select="$unit"/>', expected one of <xsl:value-of
          select="sort(map:keys($factors))" separator=", "/></xsl:message>
    </xsl:if>
    <xsl:sequence select="$value * $factors($unit)"/>
  </xsl:function>

  <!-- Numbers with blanks between. -->
  <xsl:function name="sw:numbers" as="xs:string">
    <xsl:param name="values" as="xs:double*"/>
    <xsl:sequence select="string-join(for $v in $values return string($v), ' ')"/>
  </xsl:function>

  <!-- A cell of a delimited table (RFC 4180): quoted where it has a comma, quote or line break; text that a spreadsheet
       would take for a formula gets an apostrophe. -->
  <xsl:function name="sw:cell" as="xs:string">
    <xsl:param name="text" as="xs:string"/>
    <xsl:variable name="plain" select="if (matches($text, '^[=+@]') or (matches($text, '^-') and not($text castable as xs:double)))
        then concat('''', $text) else $text"/>
    <xsl:sequence select="if (matches($plain, '[&quot;,&#10;&#13;]'))
        then concat('&quot;', replace($plain, '&quot;', '&quot;&quot;'), '&quot;') else $plain"/>
  </xsl:function>
</xsl:stylesheet>
