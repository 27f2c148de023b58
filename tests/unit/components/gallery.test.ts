/* Every page of the gallery renders, has one h1, one main, no script and no style attribute of ours. */
import { describe, expect, it } from 'vitest';
import ApproveGallery from '../../support/gallery/ApproveGallery.astro';
import CaseGallery from '../../support/gallery/CaseGallery.astro';
import ErrorGallery from '../../support/gallery/ErrorGallery.astro';
import FieldGallery from '../../support/gallery/FieldGallery.astro';
import FirstVisitGallery from '../../support/gallery/FirstVisitGallery.astro';
import FormsGallery from '../../support/gallery/FormsGallery.astro';
import ListsGallery from '../../support/gallery/ListsGallery.astro';
import SignInGallery from '../../support/gallery/SignInGallery.astro';
import { renderPage } from '../../support/render';

const PAGES = {
  case: CaseGallery,
  approve: ApproveGallery,
  lists: ListsGallery,
  forms: FormsGallery,
  field: FieldGallery,
  'sign-in': SignInGallery,
  'first-visit': FirstVisitGallery,
  error: ErrorGallery,
};
const CAUTION = 'An aid to qualified engineers.';
/** Words that are not used (the product has its own), looked for in what readers see. */
const NOT_USED = /\b(?:blind|sealed|ticked|ripple|desk|approved by Setwright)\b/i;

describe('pages of the gallery', () => {
  it.each(Object.entries(PAGES))('%s', async (name, page) => {
    const html = await renderPage(page, name);
    expect(html.match(/<h1\b/g)).toHaveLength(1);
    expect(html.match(/<main\b/g)).toHaveLength(1);
    expect(html).not.toMatch(/<script\b/);
    expect(html).toContain(CAUTION);
    const ids = [...html.matchAll(/\sid="([^"]+)"/g)].map((match) => match[1]);
    expect(ids.filter((id, i) => ids.indexOf(id) !== i)).toEqual([]);
    expect(html.replace(/<[^>]+>/g, ' ')).not.toMatch(NOT_USED);
  });
});
