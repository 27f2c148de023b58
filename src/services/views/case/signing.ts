/* What the sign form of a part needs: who signs, which words, bound to which content; only where the reader may act. */
import { type Act } from '@domain/case';
import { pageHash, signingOf } from '../../stage/sign';
import { isStageAct } from '../../stage/types';
import { newKey } from '../../form-key';
import { type CaseFrame } from './frame';
import { type OpenedCase } from './open';

export type Signing = {
  action: string;
  title: string;
  meaning: string;
  signs: string;
  pageHash: string;
  label: string;
  version: number;
  key: string;
};

/** The signing of one act, or why not: undefined where the reader could never do it in this case as it stands. */
export function signingView(
  of: OpenedCase,
  frame: CaseFrame,
  act: Act,
  words: { title: string; label: string },
): { signing?: Signing; whyNot?: string } {
  const answer = frame.acts.find((one) => one.act === act);
  if (!answer?.ok) return answer?.code === 'GATE_SHUT' ? { whyNot: answer.sentence ?? '' } : {};
  const signed = isStageAct(act) ? signingOf(act) : undefined;
  if (!signed || !isStageAct(act)) return {};
  const hash = pageHash(of.file, act);
  return {
    signing: {
      action: `/api/v1/sites/${of.file.site.slug}/cases/${frame.number}/acts/${act}`,
      title: words.title,
      meaning: signed.meaning,
      signs: `${frame.number} at hash ${hash.slice(0, 4)} ${hash.slice(4, 8)} ${hash.slice(8, 12)}`,
      pageHash: hash,
      label: words.label,
      version: frame.version,
      key: newKey(),
    },
  };
}
