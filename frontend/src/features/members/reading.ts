import type { MemberSheetDto } from '@mantlet/common';
import { fireCurveNames, formatLimitTemperature, formatThickness, wayNames } from '@mantlet/common';
import { formatDate, formatNumber } from '../../lib/format.js';
import { firstReach, valueAt } from '../../ui/drawing/chart-scale.js';
import type { LoadSide, SteelReadingData } from '../../ui/drawing/steel-reading-layout.js';
import { crossing } from '../../ui/drawing/steel-reading-words.js';

type Charts = NonNullable<MemberSheetDto['charts']>;
type LimitState = Charts['resistance'][number];

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
export const fireName = (curve: string): string => (fireCurveNames as Record<string, string>)[curve] ?? curve;
const force = (unit: string) => (value: number | null) => (value === null ? 'no value' : `${formatNumber(value, 1)} ${unit}`);

/** Bare steel at the end of the period, as stored or, where the member has no result to store it with, as drawn. */
export const bareAtEnd = ({ result, charts }: Pick<MemberSheetDto, 'result' | 'charts'>): number | null =>
  result?.bareTemperatureC ?? (charts ? valueAt(charts.bare, charts.periodMin) : null);

/** Limit states with a load on them; the one that gives the lowest temperature first. */
export function drawnStates({ charts, result }: Pick<MemberSheetDto, 'charts' | 'result'>): LimitState[] {
  const loaded = (charts?.resistance ?? []).filter((s) => s.effect > 0);
  return loaded.sort((a, b) => Number(b.limitState === result?.governing) - Number(a.limitState === result?.governing));
}

const times = (value: number | null) => (value === null ? 'no value' : `${formatNumber(value, 2)} times the effect`);

function oneState({ limitState, unit, effect, points }: LimitState): LoadSide {
  // effects that act together have no one unit: how many times they are carried
  if (unit === '') return { curves: [{ name: `${limitState}, carried`, points, className: 'd-ink' }], effect, effectText: ['effects', 'in fire'], axis: 'multiples of the effects in fire', format: times };
  const what = unit === 'kNm' ? 'bending moment' : limitState === 'shear' ? 'shear force' : 'axial force';
  return { curves: [{ name: `${limitState} resistance`, points, className: 'd-ink' }], effect, effectText: ['effect in fire', force(unit)(effect)], axis: `${what}, ${unit}`, format: force(unit) };
}

const looks = ['d-ink', 'd-thin', 'd-dashed'];
/** All limit states on one scale: each resistance as a multiple of its own effect, so that each meets its effect at 1. */
function allStates(states: readonly LimitState[]): LoadSide {
  return {
    curves: states.map((s, i) => ({ name: `${s.limitState} resistance`, points: s.points.map(([t, r]) => [t, r / s.effect] as const), className: looks[i % looks.length] as string })),
    effect: 1, effectText: ['effect', 'in fire'], axis: 'multiples of the effect in fire', format: times,
  };
}

/** What stands on the left of the drawing: a resistance, or the relation a utilisation was read from; never one that was not calculated. */
export function loadSide(sheet: Pick<MemberSheetDto, 'charts' | 'result'>, chosen: string | null): LoadSide | null {
  const states = drawnStates(sheet);
  if (chosen === 'all' && states.length > 1) return allStates(states);
  const state = states.find((s) => s.limitState === chosen) ?? states[0];
  if (state) return oneState(state);
  const utilisation = sheet.charts?.utilisation;
  if (!utilisation) return null;
  const format = (value: number | null) => (value === null ? 'no value' : formatNumber(value, 2));
  return { curves: [{ name: 'utilisation it can bear', points: utilisation.points, className: 'd-ink' }], effect: utilisation.value, effectText: ['utilisation', format(utilisation.value)], axis: 'utilisation in fire', format };
}

/** The temperature the drawing is read along: the member's own, or where another limit state is looked at, that one's crossing. */
function readAlong({ result, charts }: MemberSheetDto, chosen: string | null): number | null {
  const state = chosen === null || chosen === result?.governing ? null : charts?.resistance.find((s) => s.limitState === chosen);
  return state ? crossing(state.points, state.effect) : result?.criticalTemperatureC ?? null;
}

export function readingData(sheet: MemberSheetDto & { charts: Charts }, chosen: string | null): SteelReadingData {
  const { charts, result, zone } = sheet;
  const own = result?.criticalTemperatureC ?? null;
  const along = readAlong(sheet, chosen);
  const criticalC = along !== null && along === own && result?.verdict === 'bare' ? result.bareCriticalTemperatureC ?? own : along;
  return {
    load: loadSide(sheet, chosen), fire: charts.fire, bare: charts.bare, protected: charts.protected, periodMin: charts.periodMin, fireName: fireName(zone.curve),
    criticalC, criticalText: criticalC === null ? '' : `${along === own ? 'θ_cr ' : ''}${formatLimitTemperature(criticalC)}`,
    bareLimitC: along === own ? result?.bareCriticalTemperatureC ?? own : along,
  };
}

/** "Calculated from actions, 12 Nov 2026, I. Structural." */
export function provenance({ member, result }: Pick<MemberSheetDto, 'member' | 'result'>): string {
  const reference = 'reference' in member.basis && member.basis.reference ? `, ${member.basis.reference}` : '';
  const who = member.basisSetBy ? `, ${formatDate(member.basisSetAt)}, ${member.basisSetBy}` : '';
  return `${wayNames[member.basis.way]}${result?.assumed ? ' and not accepted' : ''}${reference}${who}.`;
}

export interface Caption { title: string; sub: string }
/** What the left drawing says, or why there is none. */
export function loadCaption(sheet: Pick<MemberSheetDto, 'member' | 'result' | 'charts'>): Caption {
  const { result, charts } = sheet;
  const critical = result?.criticalTemperatureC ?? null;
  const states = drawnStates(sheet).length;
  const sub = `${states > 1 && result?.governing ? `${capital(result.governing)} governs. ` : ''}${provenance(sheet)}`;
  if (critical === null) return { title: result?.verdict === 'under-strength' ? 'Does not carry its load cold' : 'Critical temperature not determined', sub };
  if (states > 0) return { title: `Carries its load up to ${formatLimitTemperature(critical)}`, sub };
  const why = charts?.utilisation ? '' : ' No load was compared with a resistance, so none is drawn.';
  return { title: `Critical temperature ${formatLimitTemperature(critical)}`, sub: `${sub}${why}` };
}

/** When the bare steel is too hot and until when the protected steel is not. */
export function heatingCaption(sheet: Pick<MemberSheetDto, 'result' | 'charts' | 'zone'>): Caption {
  const { result, charts, zone } = sheet;
  if (!charts) return { title: 'Heating not determined', sub: 'There is no section factor to heat the steel by.' };
  const critical = result?.criticalTemperatureC ?? null;
  const limit = result?.bareCriticalTemperatureC ?? critical;
  const minutes = limit === null ? null : result?.bareMinutes ?? firstReach(charts.bare, limit);
  const end = bareAtEnd(sheet);
  const title = limit === null ? (end === null ? 'How it heats without protection' : `Bare, it is at ${formatNumber(end)} °C after ${charts.periodMin} minutes`)
    : minutes === null ? `Bare, it stays below ${formatLimitTemperature(limit)}` : `Bare, it is at ${formatLimitTemperature(limit)} after ${Math.floor(minutes)} minutes`;
  const apart = limit !== null && critical !== null && Math.floor(limit) !== Math.floor(critical) ? ` Unprotected under a slab it may reach ${formatLimitTemperature(limit)}; protected, ${formatLimitTemperature(critical)} (κ1).` : '';
  const holds = charts.protected && critical !== null ? firstReach(charts.protected, critical) : null;
  const thickness = formatThickness(result?.requiredThickness, result?.thicknessUnit ?? 'mm');
  const held = !charts.protected ? (result?.verdict === 'protected' ? ' The product’s evidence states thickness and not how the steel heats behind it, so no protected line is drawn.' : '')
    : holds === null ? ` With ${thickness} it stays below to the end of the drawing.` : ` With ${thickness} it holds to ${Math.floor(holds)} minutes.`;
  return { title, sub: `${fireName(zone.curve)}.${apart}${held}` };
}
