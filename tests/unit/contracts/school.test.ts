import { describe, expect, it } from 'vitest';
import {
  invitePersonInput,
  proposeSchoolCode,
  proposeTerm,
  setUpSchoolInput,
  timeZone,
} from '@/lib/contracts/school';

describe('a school’s code', () => {
  it.each([
    ['Cedar Fork High School', 'cedar-fork'],
    ['The Ardmore Academy', 'ardmore'],
    ['École Saint-Éloi', 'ecole-saint-eloi'],
    ['High School', 'high-school'],
    ['木工', ''],
    ['A very long name of a school that never seems to come to any end', 'a-very-long-name-a-that-never-se'],
  ])('is proposed for %j', (name, code) => {
    const proposed = proposeSchoolCode(name);
    expect(proposed).toBe(code);
    expect(proposed === '' || /^[a-z0-9][a-z0-9-]{2,31}$/.test(proposed)).toBe(true);
  });
});

describe('a first term', () => {
  it.each([
    ['2026-12-01', { name: 'Fall 2026', startsOn: '2026-07-01', endsOn: '2026-12-31' }],
    ['2027-06-30', { name: 'Spring 2027', startsOn: '2027-01-01', endsOn: '2027-06-30' }],
    ['2027-07-01', { name: 'Fall 2027', startsOn: '2027-07-01', endsOn: '2027-12-31' }],
  ])('proposed on %s holds that day', (today, term) => {
    expect(proposeTerm(today)).toEqual(term);
    expect(term.startsOn <= today && today <= term.endsOn).toBe(true);
  });
});

describe('set-up', () => {
  const whole = {
    secret: 'a'.repeat(43),
    schoolName: 'Cedar Fork High School',
    schoolCode: ' Cedar-Fork ',
    timeZone: 'America/Chicago',
    unit: 'in',
    departmentName: 'Wood and design',
    termName: 'Fall 2026',
    startsOn: '2026-08-24',
    endsOn: '2026-12-18',
    givenName: 'Rut',
    familyName: 'Lindqvist',
    email: ' R.Lindqvist@CedarFork.example ',
    password: 'plane with the grain',
    teaches: 'on',
  };

  it('takes what a person types, with spaces and capitals where they do not matter', () => {
    const read = setUpSchoolInput.parse(whole);
    expect(read).toMatchObject({
      schoolCode: 'cedar-fork',
      email: 'r.lindqvist@cedarfork.example',
      teaches: true,
      leads: false,
    });
  });

  it.each([
    ['schoolName', '   '],
    ['schoolCode', 'a b'],
    ['schoolCode', '-ab'],
    ['timeZone', 'Mars/Olympus'],
    ['unit', 'cubit'],
    ['startsOn', '24.8.2026'],
    ['endsOn', '2026-08-24'],
    ['givenName', ''],
    ['email', 'r.lindqvist'],
    ['secret', 'short'],
  ])('refuses %s %j at its field', (field, typed) => {
    const read = setUpSchoolInput.safeParse({ ...whole, [field]: typed });
    expect(read.error?.issues.map(({ path }) => path[0])).toContain(field);
  });
});

it('knows time zones by the names of the tz database', () => {
  expect(timeZone.safeParse('Europe/Stockholm').success).toBe(true);
  expect(timeZone.safeParse('UTC').success).toBe(true);
  expect(timeZone.safeParse('').success).toBe(false);
});

describe('an invitation', () => {
  const person = { givenName: 'Rut', familyName: 'Lindqvist', email: 'rut@cedarfork.example' };

  it('asks for the department of a teacher or head, not of an aide or admin', () => {
    expect(invitePersonInput.safeParse({ ...person, roles: ['aide', 'admin'] }).success).toBe(true);
    const read = invitePersonInput.safeParse({ ...person, roles: ['head'] });
    expect(read.error?.issues[0]?.path).toEqual(['departmentId']);
  });

  it('makes nobody a student: those come by a roster', () => {
    expect(invitePersonInput.safeParse({ ...person, roles: ['student'] }).success).toBe(false);
    expect(invitePersonInput.safeParse({ ...person, roles: [] }).success).toBe(false);
  });
});
