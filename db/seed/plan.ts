/** The invented schools, people and rooms of the demo. */
export interface StaffPlan {
  key: string;
  familyName: string;
  givenName: string;
  roles: ('teacher' | 'head' | 'aide' | 'admin')[];
}

export interface SectionPlan {
  key: string;
  name: string;
  period: string;
  teacher: string;
  students: number;
}

export interface SchoolPlan {
  code: string;
  name: string;
  domain: string;
  timeZone: string;
  unit: 'in' | 'mm';
  firstLocalId: number;
  staff: StaffPlan[];
  sections: SectionPlan[];
}

export const CEDAR_FORK: SchoolPlan = {
  code: 'cedar-fork',
  name: 'Cedar Fork High School',
  domain: 'cedarfork.example',
  timeZone: 'America/Denver',
  unit: 'in',
  firstLocalId: 377,
  staff: [
    { key: 'lindqvist', familyName: 'Lindqvist', givenName: 'Rut', roles: ['teacher'] },
    { key: 'okonjo', familyName: 'Okonjo', givenName: 'Dayo', roles: ['teacher'] },
    { key: 'vass', familyName: 'Vass', givenName: 'Imre', roles: ['head'] },
    { key: 'pell', familyName: 'Pell', givenName: 'Jonah', roles: ['aide'] },
    { key: 'adeyemi', familyName: 'Adeyemi', givenName: 'Nomsa', roles: ['admin'] },
  ],
  sections: [
    { key: 'cf1', name: 'Woods 1', period: '1', teacher: 'lindqvist', students: 23 },
    { key: 'cf3', name: 'Woods 2', period: '3', teacher: 'lindqvist', students: 26 },
    { key: 'cf6', name: 'Woods 1', period: '6', teacher: 'lindqvist', students: 21 },
    { key: 'cf2', name: 'Woods 1', period: '2', teacher: 'okonjo', students: 22 },
    { key: 'cf5', name: 'Woods 2', period: '5', teacher: 'okonjo', students: 24 },
  ],
};

export const ARDMORE: SchoolPlan = {
  code: 'ardmore',
  name: 'Ardmore Academy',
  domain: 'ardmore.example',
  timeZone: 'Europe/London',
  unit: 'mm',
  firstLocalId: 2010,
  staff: [
    { key: 'brandt', familyName: 'Brandt', givenName: 'Silke', roles: ['teacher'] },
    { key: 'sorley', familyName: 'Sorley', givenName: 'Hamish', roles: ['teacher'] },
    { key: 'kerr', familyName: 'Kerr', givenName: 'Ishbel', roles: ['head', 'teacher'] },
    { key: 'osei', familyName: 'Osei', givenName: 'Abena', roles: ['admin'] },
  ],
  sections: [
    { key: 'aa4', name: 'Design and wood', period: '4', teacher: 'brandt', students: 23 },
    { key: 'aa7', name: 'Design and wood', period: '7', teacher: 'brandt', students: 20 },
    { key: 'aa1', name: 'Workshop', period: '1', teacher: 'sorley', students: 22 },
    { key: 'aa2', name: 'Workshop', period: '2', teacher: 'sorley', students: 19 },
  ],
};

/** What a room and its grader do to every size made and read there, in graduations of the rubric's unit. */
export interface RoomPlan {
  /** The rip fence stands off by this much: every width of the room. */
  fence: number;
  /** The grader reads this much too much. */
  graderBias: number;
  skill: number;
}

export const ROOMS: Record<string, RoomPlan> = {
  cf1: { fence: 0, graderBias: 0, skill: 0.8 },
  cf3: { fence: 0, graderBias: 0, skill: 0.7 },
  cf6: { fence: 0, graderBias: 0, skill: 1 },
  cf2: { fence: 0, graderBias: 0, skill: 0.9 },
  cf5: { fence: 1, graderBias: 0, skill: 0.8 },
  aa4: { fence: 0, graderBias: 0, skill: 0.8 },
  aa7: { fence: 0, graderBias: 0, skill: 0.9 },
  aa1: { fence: 0, graderBias: 1, skill: 0.8 },
  aa2: { fence: 0, graderBias: 0, skill: 1 },
};

/** What was given to whom, when, and how far it has got. */
export interface SittingPlan {
  section: string;
  practical: string;
  day: string;
  state: 'published' | 'measured' | 'under way' | 'open';
}

export const SITTINGS: SittingPlan[] = [
  { section: 'cf1', practical: 'bench-hook', day: '2026-09-22', state: 'published' },
  { section: 'cf3', practical: 'bench-hook', day: '2026-09-23', state: 'published' },
  { section: 'cf6', practical: 'bench-hook', day: '2026-09-24', state: 'measured' },
  { section: 'cf3', practical: 'six-stick', day: '2026-10-20', state: 'published' },
  { section: 'cf3', practical: 'desk-caddy', day: '2026-11-17', state: 'measured' },
  { section: 'cf5', practical: 'desk-caddy-okonjo', day: '2026-11-18', state: 'measured' },
  { section: 'cf3', practical: 'stair-tower', day: '2026-12-01', state: 'under way' },
  { section: 'cf1', practical: 'stair-tower', day: '2026-12-01', state: 'open' },
  { section: 'aa4', practical: 'gauge-kit', day: '2026-11-10', state: 'measured' },
  { section: 'aa1', practical: 'gauge-kit-sorley', day: '2026-11-11', state: 'measured' },
  { section: 'aa7', practical: 'wall-rack', day: '2026-12-01', state: 'open' },
];
