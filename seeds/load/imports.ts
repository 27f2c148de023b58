/* What the header revisions that a basis pins lend to it, from the stored node pressures of the invented site. */
import { type Basis, hashOf, type Hash } from '@domain/basis';
import { type Header } from '@domain/header';
import { type HeaderImport, type ImportSet } from '@domain/evaluate';
import { causeId, headerOf, plainQ, RESULTS, SITE } from '../convert';

/** Segments on the way from a node to the tip, nearest first. */
function wayToTip(header: Header, node: string): Header['segments'] {
  const way: Header['segments'] = [];
  for (let at = node; ;) {
    const next = header.segments.find((segment) => segment.to === at);
    if (!next) return way;
    way.push(next);
    at = next.from;
  }
}

function lentBy(tag: string, nodeId: string): HeaderImport | undefined {
  const demo = SITE.headers.find((candidate) => candidate.id === tag);
  if (!demo) return undefined;
  const header = headerOf(demo);
  const node = header.nodes.find((candidate) => candidate.id === nodeId)?.name ?? '';
  const causes = Object.entries(RESULTS.headers[tag] ?? {}).flatMap(([cause, stored]) => {
    const at = stored.nodes[node];
    return at ? [[causeId(cause), { at: plainQ(at), flow: plainQ(stored.total_flow) }] as const] : [];
  });
  const network = wayToTip(header, nodeId).map(({ from: _from, to: _to, ...segment }) => segment);
  return {
    revision: 1,
    network,
    normal: plainQ(demo.normal_pressure),
    viscosity: plainQ(demo.gas_viscosity),
    causes: Object.fromEntries(causes),
  };
}

/** The import set of a basis: one entry a header that it pins. */
export function importSetOf(basis: Basis): ImportSet {
  const headers = basis.imports.flatMap((pin) => {
    const tag = pin.header.replace('doc_hdr', 'HDR-');
    const lent = lentBy(tag, pin.node);
    return lent ? [[pin.header, lent] as const] : [];
  });
  return { headers: Object.fromEntries(headers), loads: {} };
}

/** The hash under which an import set is kept and bound. */
export function importsHash(imports: ImportSet): Hash {
  return hashOf('imports', imports);
}
