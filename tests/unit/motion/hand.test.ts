import { describe, expect, it } from 'vitest';
import { bounceMarks, readMarks } from './factories.ts';

const bounces = bounceMarks({ start: 3.3, lengths: [14, 11.2, 9], gravity: 6, frames: 42, noise: 0.3 });
const contactsOf = (reading: ReturnType<typeof readMarks>) => reading.objects[0]!.contacts;

describe('work of a hand is honoured, and everything else is read anew around it', () => {
  it('a contact that someone moves stays where it was put', () => {
    const reading = readMarks(bounces, {}, { hand: { contacts: [17.8] } });
    const moved = contactsOf(reading).filter((contact) => contact.origin === 'hand');
    expect(moved.map((contact) => contact.frame)).toEqual([17.8]);
    expect(contactsOf(reading)).toHaveLength(contactsOf(readMarks(bounces)).length);
  });

  it('a flight that someone splits becomes two', () => {
    const reading = readMarks(bounces, {}, { hand: { contacts: [10] } });
    expect(reading.objects[0]!.flights).toHaveLength(4);
    expect(reading.objects[0]!.flights[0]!.landing).toBeCloseTo(10, 6);
  });

  it('a contact that someone takes away is not read again', () => {
    const reading = readMarks(bounces, {}, { hand: { removed: [28.5] } });
    expect(contactsOf(reading).some((contact) => Math.abs(contact.frame - 28.5) < 1.5)).toBe(false);
    expect(reading.objects[0]!.flights).toHaveLength(2);
  });

  it('a take-off and a landing stay where they were set', () => {
    const { flights } = readMarks(bounces, {}, { hand: { takeOffs: [3], landings: [37] } }).objects[0]!;
    expect(flights[0]!.takeOff).toBe(3);
    expect(flights[flights.length - 1]!.landing).toBe(37);
  });

  it('a flight that is marked as no free flight is not judged and pulls at nothing', () => {
    const marks = bounceMarks({
      start: 3.3,
      lengths: [14, 14.5, 11],
      gravity: 6,
      gravities: [6, 3.9, 6],
      frames: 46,
      noise: 0.3,
    });
    const reading = readMarks(marks, {}, { hand: { notFree: [{ from: 17, to: 32 }] } });
    expect(reading.findings).toEqual([]);
    expect(reading.objects[0]!.flights.map((flight) => flight.judged)).toEqual([true, false, true]);
    expect(reading.objects[0]!.flights[0]!.gravity.value).toBeCloseTo(6, 0);
    expect(reading.cautions.join(' ')).toContain('no free flight');
  });
});
