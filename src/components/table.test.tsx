// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { Table } from '#src/components/table.tsx';

afterEach(cleanup);

const rows = [{ tag: 'D-0411' }, { tag: 'D-0412' }, { tag: 'D-0413' }];

function show() {
  render(
    <Table
      caption="Drops"
      rows={rows}
      rowKey={(row) => row.tag}
      columns={[
        { key: 'tag', head: 'Tag', rowHead: true, cell: (row) => <a href={`#${row.tag}`}>{row.tag}</a> },
        { key: 'slot', head: 'Slot', cell: () => 'B-3-2' },
      ]}
      foot={{ tag: '3 drops' }}
    />,
  );
}

describe('Table', () => {
  it('is a table to a screen reader, with headers for columns and rows', () => {
    show();
    expect(screen.getByRole('table', { name: 'Drops' })).toBeTruthy();
    expect(screen.getAllByRole('columnheader').map((head) => head.textContent)).toEqual(['Tag', 'Slot']);
    expect(screen.getAllByRole('rowheader').map((head) => head.textContent)).toEqual([
      'D-0411',
      'D-0412',
      'D-0413',
    ]);
    expect(screen.getByText('3 drops')).toBeTruthy();
  });

  it('moves between rows with the arrow keys, Home and End, and stays at the ends', () => {
    show();
    const focused = () => document.activeElement?.textContent;
    const press = (key: string) => fireEvent.keyDown(document.activeElement ?? document.body, { key });
    screen.getByRole('link', { name: 'D-0411' }).focus();
    press('ArrowDown');
    expect(focused()).toBe('D-0412');
    press('End');
    expect(focused()).toBe('D-0413');
    press('ArrowDown');
    expect(focused()).toBe('D-0413');
    press('Home');
    expect(focused()).toBe('D-0411');
    press('ArrowUp');
    expect(focused()).toBe('D-0411');
  });
});
