/** Accounts of the demo; their words are no secret. */
export const demoPassword = 'oak-and-rope-2026';

export const demoSignIns = [
  { email: 'builder@holdfast.example', name: 'Robin Alder', role: 'member', what: 'builds the hall bench' },
  { email: 'helper@holdfast.example', name: 'Sam Rowan', role: 'member', what: 'helps on it' },
  { email: 'author@holdfast.example', name: 'Kit Hawthorn', role: 'author', what: 'wrote the plans' },
];
