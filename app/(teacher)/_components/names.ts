interface Named {
  familyName: string;
  givenName: string;
}

/** As a roster has it: `Quispe, Wayra`. */
export function rosterName({ familyName, givenName }: Named): string {
  return [familyName, givenName].filter(Boolean).join(', ');
}

/** As people say it: `Wayra Quispe`. */
export function spokenName({ familyName, givenName }: Named): string {
  return `${givenName} ${familyName}`.trim();
}

/** A bare number or letter gets the word before it; whoever typed the word has it already. */
export function sayPeriod(period: string): string {
  return /^period\b/i.test(period) ? period : `period ${period}`;
}

export function count(number: number, one: string, many: string): string {
  return number === 1 ? `1 ${one}` : `${number} ${many}`;
}
