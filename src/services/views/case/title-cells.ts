/* The cells of a case's title block: systems, originator, day, and who the reader is in it. */
import { capital } from '@domain/basis';
import { seatsOf, SEAT_WORDS } from '@domain/case';
import { domainSeats, nameIn } from '../../case-file';
import { whoOf } from '../../context';
import { type CaseFrame } from './frame';
import { type OpenedCase } from './open';

/** Four facts of the case for its title block. */
export function cellsOf(of: OpenedCase, base: string): CaseFrame['cells'] {
  const { file } = of;
  const own = file.documents[0];
  const revision = own?.base?.number;
  const originator = file.seats.find((one) => one.role === 'originator' && !one.untilAt);
  const seats = seatsOf(whoOf(of.actor), domainSeats(file.seats));
  const system = own
    ? `${own.document.tag}${revision == null ? '' : ` rev ${String(revision)}`}${file.documents.length > 1 ? ` and ${String(file.documents.length - 1)} more` : ''}`
    : '–';
  return [
    {
      label: file.documents.length > 1 ? 'Systems' : 'System',
      fact: system,
      href: own ? `/s/${file.site.slug}/systems/${own.document.tag}` : base,
    },
    { label: 'Originator', fact: originator ? nameIn(file, originator.personId) : '–' },
    {
      label: 'Raised',
      fact: new Intl.DateTimeFormat('en-GB', {
        timeZone: file.site.timeZone,
        day: 'numeric',
        month: 'short',
        year: 'numeric',
      }).format(new Date(file.row.raisedAt)),
      num: true,
    },
    {
      label: 'You are',
      fact:
        seats.length > 0
          ? capital(seats.map((seat) => SEAT_WORDS[seat].replace(/^(the|an) /, '')).join(', '))
          : 'Reading',
    },
  ];
}
