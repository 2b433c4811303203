import { strToU8, zipSync } from 'fflate';

interface Foreign {
  readonly identifier: string;
  readonly key: string;
  readonly title?: string;
  readonly tolerance?: { readonly mode: string; readonly text: string };
  readonly marks?: string;
}

/** A text entry item as another program could write it: structure from memory of the information model of QTI 3.0. */
export const foreignXml = ({ identifier, key, title = identifier, tolerance, marks = '1' }: Foreign): string => `<?xml version="1.0" encoding="UTF-8"?>
<!-- written by hand -->
<qti-assessment-item xmlns="http://www.imsglobal.org/xsd/imsqtiasi_v3p0" identifier="${identifier}" title="${title}" adaptive="false" time-dependent="false">
  <qti-response-declaration identifier="RESPONSE" cardinality="single" base-type="float"><qti-correct-response><qti-value>${key}</qti-value></qti-correct-response></qti-response-declaration>
  <qti-outcome-declaration identifier="SCORE" cardinality="single" base-type="float"/>
  <qti-outcome-declaration identifier="MAXSCORE" cardinality="single" base-type="float"><qti-default-value><qti-value>${marks}</qti-value></qti-default-value></qti-outcome-declaration>
  <qti-item-body><div><p>Find <em>H</em><sub>f</sub> of 10<sup>3</sup> g
    &amp; say &lt;it&gt; <qti-text-entry-interaction response-identifier="RESPONSE"/>.</p></div></qti-item-body>
  <qti-response-processing><qti-response-condition>
    <qti-response-if>
      <qti-equal ${tolerance ? `tolerance-mode="${tolerance.mode}" tolerance="${tolerance.text}"` : 'tolerance-mode="exact"'}><qti-variable identifier="RESPONSE"/><qti-correct identifier="RESPONSE"/></qti-equal>
      <qti-set-outcome-value identifier="SCORE"><qti-base-value base-type="float">${marks}</qti-base-value></qti-set-outcome-value>
    </qti-response-if>
    <qti-response-else><qti-set-outcome-value identifier="SCORE"><qti-base-value base-type="float">0</qti-base-value></qti-set-outcome-value></qti-response-else>
  </qti-response-condition></qti-response-processing>
</qti-assessment-item>`;

/** A package of item files by identifier, listed in a manifest in that order. */
export function packageOf(items: Readonly<Record<string, string>>): Uint8Array {
  const resources = Object.keys(items).map((name) => `<resource identifier="${name}" type="imsqti_item_xmlv3p0" href="${name}.xml"><file href="${name}.xml"/></resource>`);
  const manifest = `<manifest xmlns="http://www.imsglobal.org/xsd/qti/qtiv3p0/imscp_v1p1" identifier="m"><organizations/><resources>${resources.join('')}</resources></manifest>`;
  return zipSync({ 'imsmanifest.xml': strToU8(manifest), ...Object.fromEntries(Object.entries(items).map(([name, xml]) => [`${name}.xml`, strToU8(xml)])) });
}
