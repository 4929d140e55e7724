import 'server-only';
import { formatJunit } from '@/lib/domain/assessment/format-junit';
import type { OutcomeReading } from '@/lib/services/studies/get-outcome';

/** Whether the caller would rather have XML than JSON. */
export function wantsXml(headers: Headers): boolean {
  const accepted = (headers.get('accept') ?? '').split(',').map((entry) => entry.split(';')[0]?.trim().toLowerCase());
  const [xml, json] = [accepted.findIndex((type) => type === 'application/xml' || type === 'text/xml'), accepted.indexOf('application/json')];
  return xml >= 0 && (json < 0 || xml < json);
}

/** 202 with the state until there is an outcome, then it as JSON or as JUnit XML. */
export function outcomeResponse(reading: OutcomeReading, headers: Headers, as: { xml: boolean; inconclusive: 'fail' | 'skip' }): Response {
  headers.set('vary', 'accept');
  if (reading.answer !== null && as.xml) {
    headers.set('content-type', 'application/xml; charset=utf-8');
    return new Response(formatJunit(reading.answer, as.inconclusive), { status: 200, headers });
  }
  headers.set('content-type', 'application/json');
  return new Response(JSON.stringify(reading.answer ?? { state: reading.state }), { status: reading.answer === null ? 202 : 200, headers });
}
