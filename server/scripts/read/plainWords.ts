import { type Flight, type Reading, type ReadObject, shownFrame } from '../../../shared/reading/document.ts';

/** The reading as a page of plain words: what an animator would be told across a desk, in the production's frames. */
export function plainWords(reading: Reading, title: string): string {
  const { source } = reading;
  const frame = (number: number): string => say(number + source.firstFrame - 1);
  const lines: string[] = [title, headLine(reading)];
  for (const object of reading.objects) lines.push('', ...objectLines(object, reading, frame));
  lines.push('', reading.findings.length === 0 ? noFindings(reading) : findingsHead(reading.findings.length));
  for (const finding of reading.findings) {
    const from = shownFrame(finding.fromFrame, source.firstFrame);
    const to = shownFrame(finding.toFrame, source.firstFrame);
    const where = from === to ? `frame ${from}` : `frames ${from}–${to}`;
    lines.push(`  ${finding.title} (${finding.object}, ${where}, ${finding.severity}). ${finding.detail}`);
  }
  if (reading.cautions.length > 0) lines.push('', 'Bear in mind', ...reading.cautions.map((caution) => `  ${caution}`));
  return `${lines.join('\n')}\n`;
}

function headLine({ source, camera }: Reading): string {
  const rate = source.fps.den === 1 ? `${source.fps.num}` : `${source.fps.num}/${source.fps.den}`;
  const holds = { 1: 'on ones', 2: 'on twos', 3: 'on threes', mixed: 'ones, twos and threes mixed' }[source.hold];
  const last = shownFrame(source.frames, source.firstFrame);
  const size = source.width > 0 ? `, ${source.width} × ${source.height} px` : '';
  const move = camera.moved ? ', the camera moves' : '';
  return `Frames ${source.firstFrame}–${last} at ${rate} a second, ${holds}${size}${move}.`;
}

function objectLines(object: ReadObject, reading: Reading, frame: (number: number) => string): string[] {
  const first = object.marks[0];
  const last = object.marks.at(-1);
  if (!first || !last) return [`${object.id}: nothing was found to follow.`];
  const marks = `${object.id}: ${object.marks.length} marks from frame ${frame(first.frame)} to ${frame(last.frame)}.`;
  const outcome = {
    read: '',
    'too-few-marks': ' Too few to read a flight.',
    'no-motion': ' It does not move.',
    'not-in-flight': ' It is not in flight.',
    'not-judged': ' Measured, not judged.',
  }[object.outcome];
  return [marks + outcome, ...object.flights.map((flight) => `  ${flightLine(flight, reading, frame)}`)];
}

function flightLine(flight: Flight, reading: Reading, frame: (number: number) => string): string {
  const parts = [
    flight.takeOff === null ? 'in the air when the strip begins' : `takes off at ${frame(flight.takeOff)}`,
    ...(flight.apex === null ? [] : [`apex at ${frame(flight.apex.frame)}`]),
    flight.landing === null ? 'still in the air at the end' : `lands at ${frame(flight.landing)}`,
  ];
  const metric = flight.gravity.metric;
  const gravity = metric ? `${say(metric.value)} m/s²` : `${say(flight.gravity.value)} px/frame²`;
  const depth = flight.model === 'depth' ? ', moving towards or away from the camera' : '';
  const unread = flight.judged ? '' : ' Not judged: someone said this is no free flight.';
  const across = `${say(Math.abs(flight.across.value))} px a frame across`;
  return `${flight.id} ${parts.join(', ')}; ${across}, gravity ${gravity}${reading.source.scale && !metric ? ' (no scale)' : ''}${depth}.${unread}`;
}

function findingsHead(count: number): string {
  return count === 1 ? 'One thing to look at' : `${count} things to look at`;
}

function noFindings(reading: Reading): string {
  const read = reading.objects.some((object) => object.flights.length > 0);
  return read ? 'Nothing to mend: the arc is true.' : 'There is no flight to judge.';
}

function say(value: number): string {
  const digits = Math.abs(value) >= 100 || Number.isInteger(value) ? 1 : 2;
  return String(Number(value.toFixed(digits)));
}
