import {
  type Cell,
  type Column,
  type ListSection,
  type TableSection,
  type TechnicalDocument,
  titleBlockFields,
} from './technical-document.ts';
import { guarded } from './formula-guard.ts';

export type DataValue = string | number;

/** A table of plain values, text guarded against being run as a formula. */
export interface DataTable {
  readonly name: string;
  readonly header: readonly string[];
  readonly records: readonly (readonly DataValue[])[];
}

/** The tables a workbook or a CSV carries: those of the document in its order, then lists, then the title block. */
export function dataTables(document: TechnicalDocument): DataTable[] {
  const sections = document.rows.flat();
  const tables = sections.filter((section) => section.kind === 'table');
  const lists = sections.filter((section) => section.kind === 'list');
  const all = [...tables.map(ofTable), ...lists.map(ofList), ofTitleBlock(document)];
  return document.stamp === null ? all : all.map(stamped(document.stamp));
}

/** The stamp in front of every record, where no cut can take it off. */
const stamped =
  (stamp: string) =>
  ({ name, header, records }: DataTable): DataTable => ({
    name,
    header: ['Status', ...header],
    records: records.map((record) => [stamp, ...record]),
  });

function ofTable({ heading, columns, records }: TableSection): DataTable {
  const kept = (_: unknown, index: number) => columns[index]?.data === true;
  return {
    name: heading,
    header: columns.filter(kept).map(headingWithUnit),
    records: records.map((cells) => cells.filter(kept).map(valueOf)),
  };
}

const headingWithUnit = ({ heading, unit }: Column) =>
  unit === undefined ? heading : `${heading}, ${unit}`;

const valueOf = ({ text, number }: Cell): DataValue => number ?? guarded(text);

function ofList({ heading, items }: ListSection): DataTable {
  return { name: heading, header: ['Text'], records: items.map(({ text }) => [guarded(text)]) };
}

function ofTitleBlock(document: TechnicalDocument): DataTable {
  const fields: [string, string][] = [
    ...titleBlockFields(document),
    ...document.facts.map(({ label, value }): [string, string] => [label, value]),
    ['Made', document.occasion],
    ['Content', document.content.full],
    ['Program', document.program],
  ];
  return {
    name: 'Title block',
    header: ['Field', 'Value'],
    records: fields.map(([field, value]) => [field, guarded(value)]),
  };
}
