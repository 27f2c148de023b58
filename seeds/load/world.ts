/* What every part of the loader shares: the open transaction, the site, its rules and the shift of dates. */
import { type JudgementRules, type SiteRules } from '@domain/rules';
import { type Db } from '@data/connection';
import { type Shift } from '../cases/dates';
import { type StoreFile } from './photos';

export const SITE_ID = 'site_ketterwold';
export const RULES_ID = 'rules_ketterwold_1';
export const ZONE = 'Europe/Vienna';

export type World = {
  trx: Db;
  shift: Shift;
  rules: SiteRules;
  judgement: JudgementRules;
  today: string;
  storeFile?: StoreFile;
};
