/* Smaller parts of a system's page: all scenarios by status, lines with their losses, outcomes of the rulebook. */
import { type Basis, plainText, STATUSES, type Status } from '@domain/basis';
import { scenarioLabel } from '@domain/projections';
import { clearedBy, type Outcome } from '@domain/rulebook';
import { SCENARIOS } from '@domain/scenarios';
import { type RuleWords, ruleWords } from '../rule-words';
import { type Shown, shownFigure } from '../shown';
import { baseOf } from './frame';
import { type OpenedSystem, type Seen } from './open';
import { dischargeOf, pointsOf } from './points';
import { numbered } from './scenario-lines';

export const STATUS_LABELS: Record<Status, string> = {
  normal: 'Normal',
  'start-up': 'Start-up',
  shutdown: 'Shutdown',
  standby: 'Standby',
  isolated: 'Isolated',
  cleaning: 'Cleaning',
};
export const DISPOSITION_WORDS: Record<string, string> = {
  credible: 'Credible',
  'below-limit': 'Stays below limit',
  'not-credible': 'Not credible',
  'not-applicable': 'Not applicable',
};

export type MatrixView = {
  statuses: { key: string; label: string }[];
  groups: {
    name: string;
    lines: {
      key: string;
      name: string;
      href: string;
      statuses: Record<string, boolean | undefined>;
      disposition?: string;
      reason?: string;
    }[];
  }[];
  count: { all: number; disposed: number };
};

function dependsWords(doc: Basis, id: string): string {
  const scenario = doc.scenarios.find((one) => one.id === id);
  const tags = (scenario?.dependsOn ?? []).map((one) => `${one.tag} (${one.kind.replaceAll('-', ' ')})`);
  return tags.length === 0 ? '' : ` Depends on ${tags.join(', ')}.`;
}

/** All scenarios of a basis by operating status; standard ones that the basis does not have yet stand as to do. */
export function matrixOf(of: OpenedSystem, { body: doc }: Seen): MatrixView {
  const lines = numbered(doc).map(({ scenario, number }) => {
    const reason = `${plainText(scenario.reason)}${dependsWords(doc, scenario.id)}`;
    const disposition = scenario.disposition && DISPOSITION_WORDS[scenario.disposition];
    return {
      key: scenario.id,
      name: `${String(number)} ${scenarioLabel(doc, scenario)}`,
      href: `#${scenario.id}`,
      statuses: Object.fromEntries(STATUSES.map((status) => [status, scenario.statuses[status]])),
      ...(disposition ? { disposition } : {}),
      ...(reason === '' ? {} : { reason }),
    };
  });
  const missing = SCENARIOS.filter((one) => !doc.scenarios.some((each) => each.key === one.key));
  const toDo = missing.map((one) => ({
    key: one.key,
    name: one.name,
    href: `${baseOf(of)}/scenarios`,
    statuses: Object.fromEntries(STATUSES.map((status) => [status, undefined])),
  }));
  const groups = [
    { name: 'Examined', lines },
    { name: 'Not yet asked', lines: toDo },
  ].filter((group) => group.lines.length > 0);
  return {
    statuses: STATUSES.map((key) => ({ key, label: STATUS_LABELS[key] })),
    groups,
    count: {
      all: lines.length + toDo.length,
      disposed: lines.filter((line) => 'disposition' in line).length,
    },
  };
}

export type LineView = {
  id: string;
  name: string;
  facts: string[];
  segments: {
    id: string;
    nominal: string;
    bore?: Shown;
    length?: Shown;
    rise?: Shown;
    fittings: string;
    shared: string;
  }[];
  end: string;
};
export type LinesView = {
  lines: LineView[];
  results: { point: string; label: string; text: string; href: string }[];
};

function lineFacts(line: Basis['lines'][number]): string[] {
  return [
    line.drawing && `drawing ${line.drawing}`,
    line.from && `from ${line.from}`,
    line.selfDraining === undefined ? '' : line.selfDraining ? 'self-draining' : 'not self-draining',
    line.pocket === true && 'has a pocket',
    line.tracing !== undefined && line.tracing !== 'none' && line.tracing,
  ].filter((one): one is string => typeof one === 'string' && one !== '');
}

/** The inlet and outlet lines of an opened system, and what they come to. */
export function linesOf(of: OpenedSystem, seen: Seen): LinesView {
  const { body: doc } = seen;
  const tag = (id: string) => doc.reliefPoints.find((one) => one.id === id)?.tag ?? '';
  const users = (segment: string) =>
    doc.lines.filter((line) => line.path.includes(segment)).map((line) => tag(line.point));
  const lines = doc.lines.map((line) => {
    const point = doc.reliefPoints.find((one) => one.id === line.point);
    return {
      id: line.id,
      name: `${tag(line.point)}, ${line.side}`,
      facts: lineFacts(line),
      segments: line.path.flatMap((id) => {
        const segment = doc.segments.find((one) => one.id === id);
        if (!segment) return [];
        const [bore, length, rise] = [segment.bore, segment.length, segment.rise].map((one) =>
          shownFigure(one),
        );
        const shared = [...new Set(users(id).filter((other) => other !== tag(line.point)))].join(', ');
        return [
          {
            id,
            nominal: segment.nominal ?? '',
            ...(bore ? { bore } : {}),
            ...(length ? { length } : {}),
            ...(rise ? { rise } : {}),
            fittings: segment.fittings.map((one) => `${String(one.count)} × ${one.name}`).join(', '),
            shared,
          },
        ];
      }),
      end: line.side === 'outlet' && point ? dischargeOf(of, doc, point) : '',
    };
  });
  const results = pointsOf(of, seen).points.flatMap((point) =>
    point.results
      .filter((one) => !one.label.startsWith('Rated'))
      .map((one) => ({ point: point.tag, ...one })),
  );
  return { lines, results };
}

export type OutcomeView = {
  code: string;
  severity: Outcome['severity'];
  subject: string;
  sentence: string;
  rule: RuleWords;
  inherited?: boolean;
  justification?: { text: string; by: string };
};

const ORDER = { stop: 0, justify: 1, note: 2 };

/** Outcomes of the rulebook on an opened system: stops first, what an earlier revision already failed marked as inherited. */
export function outcomesOf(of: OpenedSystem, seen: Seen, people: ReadonlyMap<string, string>): OutcomeView[] {
  return seen.outcomes
    .toSorted((a, b) => ORDER[a.severity] - ORDER[b.severity])
    .map((one) => {
      const cleared = of.hidden ? undefined : clearedBy(one, seen.body);
      return {
        code: one.code,
        severity: one.severity,
        subject: one.tag,
        sentence: one.sentence,
        rule: ruleWords(of.actor.site.slug, one.code),
        ...(one.inherited ? { inherited: true } : {}),
        ...(cleared
          ? {
              justification: {
                text: plainText(cleared.text),
                by: `${people.get(cleared.by) ?? ''}, ${cleared.on}`,
              },
            }
          : {}),
      };
    });
}
