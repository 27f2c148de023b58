/* What is asked in each part of a field sheet, in the words of someone who stands at the valve. */

const QUESTIONS: Readonly<Record<string, string>> = {
  identity: 'Which device hangs here?',
  nameplate: 'What does the nameplate say?',
  certificate: 'What does the test certificate say?',
  seals: 'Are the seals whole?',
  isolation: 'How do the isolation valves stand?',
  bonnet: 'How is the bonnet left?',
  transport: 'Is everything from transport and test gone?',
  piping: 'Are the lines as drawn?',
  discharge: 'Where does it discharge?',
  equipment: 'What does the plate of the equipment say?',
  sources: 'What is fitted in the machines and valves?',
  'field conditions': 'How do the field conditions stand?',
};

/** The question that heads a part. */
export function questionOf(part: string): string {
  return QUESTIONS[part] ?? `What do you see: ${part}?`;
}

/** "Nameplate" of "nameplate". */
export function partWord(part: string): string {
  return part.charAt(0).toUpperCase() + part.slice(1);
}
