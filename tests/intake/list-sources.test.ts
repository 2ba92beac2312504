import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { sourceColumn } from '../../src/intake/list-sources.js';
import type { ReadList } from '../../src/intake/list.js';
import { figureSlot } from '../../src/parts/figures.js';
import { genericList } from '../support/generic-list.js';
import { accepted } from './reading.js';

const ORDINARY = readFileSync(join(import.meta.dirname, 'ordinary-list.csv'));

/** Slots of a part, each with the letter of its column and the cell there. */
function cells(list: ReadList, index: number): Record<string, string | null> {
  return Object.fromEntries((list.parts[index]?.figures ?? []).map((figure) => {
    const slot = figureSlot(figure);
    const column = sourceColumn(list, slot, index);
    return [slot, column === null ? null : `${column.letter} ${list.records[index]?.cells[column.number - 1] ?? ''}`];
  }));
}

describe('where figures stand', () => {
  it('two figures in one cell are both of that cell', () => {
    const list = accepted('Part number,Vos typ/max (mV),Ib (pA)\nA,0.5/3,2 typ\nB,max 2,<10\n');
    expect(cells(list, 0)).toEqual({ 'offsetVoltage.typ': 'B 0.5/3', 'offsetVoltage.max': 'B 0.5/3', 'biasCurrent.typ': 'C 2 typ' });
    expect(cells(list, 1)).toEqual({ 'offsetVoltage.max': 'B max 2', 'biasCurrent.max': 'C <10' });
    expect(list.sources.others.size).toBe(0);
  });

  it('a slot that two columns can fill is that of the row', () => {
    const list = accepted('Part number,Vos typ (mV),Vos (mV)\nA,0.5,max 2\nB,,1\nC,0.7,0.7\n');
    expect([0, 1, 2].map((index) => cells(list, index)['offsetVoltage.typ'])).toEqual(['B 0.5', 'C 1', 'B 0.7']);
  });

  it('words are the cell they stand in, a description too; what a class lends is that of the words', () => {
    const list = accepted('Part number,Type description,Rail-to-rail,GBW typ (MHz),SR typ (V/µs),Iq (µA)\nA,CMOS,RRIO,1,0.5,80\nB,"CMOS, rail-to-rail in/out",,1,0.5,80\n', { generic: genericList.parts, classWithin: 1 });
    expect(cells(list, 0)['inputLowHeadroom.typ']).toBe('C RRIO');
    expect(cells(list, 1)['inputLowHeadroom.typ']).toBe('B CMOS, rail-to-rail in/out');
    const lent = Object.entries(cells(list, 0)).filter(([slot]) => slot.startsWith('outputLowHeadroom'));
    expect(lent.length).toBeGreaterThan(0);
    expect(new Set(lent.map(([, cell]) => cell))).toEqual(new Set(['C RRIO']));
  });

  it('a declared range is of no cell, beside parts that state one; a declared condition keeps its cell', () => {
    const list = accepted('Part number,Vos max (mV),Temp range (°C)\nA,3,\nB,2,0..70\n', { declare: { temperature: [-40, 85], offsetVoltage: 'over' } });
    expect(cells(list, 0)).toEqual({ 'offsetVoltage.max@Tover': 'B 3', 'temperature.min': null, 'temperature.max': null });
    expect(cells(list, 1)).toEqual({ 'offsetVoltage.max@Tover': 'B 2', 'temperature.min': 'C 0..70', 'temperature.max': 'C 0..70' });
    expect(list.sources.declared).toBe('temperature -40..85 °C, offset voltage over temperature');
  });

  it('the canonical CSV needs no word about it', () => {
    expect(accepted('id,offset voltage max (mV)\nA,3\n').sources).toEqual({ usual: new Map(), others: new Map(), declared: null });
  });

  it('every figure of forty ordinary rows stands in a cell that says something', () => {
    const list = accepted(ORDINARY, { generic: genericList.parts, classWithin: 0.3 });
    const all = list.parts.flatMap((_, index) => Object.entries(cells(list, index)));
    expect(all.length).toBeGreaterThan(500);
    expect(all.filter(([, cell]) => cell === null || cell.length < 3)).toEqual([]);
  });
});
