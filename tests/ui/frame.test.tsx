import { act, screen } from '@testing-library/react';
import { useState } from 'react';
import { beforeEach, describe, expect, test } from 'vitest';
import { KeyList } from '../../src/app/KeyList.tsx';
import { LineNote } from '../../src/app/LineNote.tsx';
import { Button } from '../../src/components/Button.tsx';
import { Menu } from '../../src/components/Menu.tsx';
import { StateChip } from '../../src/components/StateChip.tsx';
import { Tabs } from '../../src/components/Tabs.tsx';
import { TextField } from '../../src/components/TextField.tsx';
import { HereNow } from '../../src/features/presence/HereNow.tsx';
import { SignInForm } from '../../src/features/session/SignInForm.tsx';
import { useKeys } from '../../src/lib/keys.ts';
import { setLineState } from '../../src/lib/lineState.ts';
import { hereOptions } from '../../src/lib/queries/production.ts';
import { BRITTA, OTIS } from '../support/wire.ts';
import { filledClient, screenOf, show, SLUG } from './show.tsx';

beforeEach(() => screenOf(1440));

describe('signing in', () => {
  test('says what is missing at its own field before anything is sent', async () => {
    const { user } = show(<SignInForm onSignedIn={() => {}} />);
    await user.type(screen.getByLabelText('Email'), 'britta');
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(screen.getByText('Write the address you sign in with.')).toBeTruthy();
    expect(screen.getByText('Write your password.')).toBeTruthy();
    const email = screen.getByLabelText('Email');
    expect(email.getAttribute('aria-invalid')).toBe('true');
    expect(document.getElementById(email.getAttribute('aria-describedby')!)?.textContent).toContain(
      'Write the address',
    );
  });
});

describe('a menu', () => {
  function showMenu() {
    const done: string[] = [];
    const items = ['Light', 'Dark', 'Sign out'].map((label) => ({ label, run: () => done.push(label) }));
    const shown = show(
      <>
        <Menu label="Menu" items={items}>
          Menu
        </Menu>
        <button type="button">beside</button>
      </>,
    );
    return { ...shown, done };
  }

  test('opens, moves with the arrows round the end, runs with Enter and gives the focus back', async () => {
    const { user, done } = showMenu();
    await user.click(screen.getByRole('button', { name: 'Menu' }));
    expect(document.activeElement?.textContent).toBe('Light');
    await user.keyboard('{ArrowUp}');
    expect(document.activeElement?.textContent).toBe('Sign out');
    await user.keyboard('{ArrowDown}{ArrowDown}{Enter}');
    expect(done).toEqual(['Dark']);
    expect(screen.queryByRole('menu')).toBeNull();
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Menu' }));
  });

  test('closes with Escape and with a press beside it, doing nothing', async () => {
    const { user, done } = showMenu();
    const button = screen.getByRole('button', { name: 'Menu' });
    await user.click(button);
    await user.keyboard('{Escape}');
    expect(screen.queryByRole('menu')).toBeNull();
    expect(document.activeElement).toBe(button);
    await user.click(button);
    await user.click(screen.getByRole('button', { name: 'beside' }));
    expect(screen.queryByRole('menu')).toBeNull();
    expect(done).toEqual([]);
  });
});

describe('keys', () => {
  function Screen({ onStep }: { onStep: () => void }) {
    useKeys('Picture', [{ key: 'n', says: 'Write a note on this frame', run: onStep }]);
    return <input aria-label="note" />;
  }

  test('work anywhere, but not in what is being written', async () => {
    let steps = 0;
    const { user } = show(<Screen onStep={() => (steps += 1)} />);
    await user.keyboard('n');
    expect(steps).toBe(1);
    await user.type(screen.getByLabelText('note'), 'now');
    expect(steps).toBe(1);
    expect((screen.getByLabelText('note') as HTMLInputElement).value).toBe('now');
  });

  test('stay silent together with Ctrl, so that the browser keeps its own', async () => {
    let steps = 0;
    const { user } = show(<Screen onStep={() => (steps += 1)} />);
    await user.keyboard('{Control>}n{/Control}');
    expect(steps).toBe(0);
  });

  test('are gone with their screen', async () => {
    let steps = 0;
    const { user, unmount } = show(<Screen onStep={() => (steps += 1)} />);
    unmount();
    await user.keyboard('n');
    expect(steps).toBe(0);
  });

  test('do the newest thing a screen gave them, without being registered anew', async () => {
    function Counting() {
      const [count, setCount] = useState(0);
      useKeys('Picture', [{ key: 'n', says: 'Count', run: () => setCount(count + 1) }]);
      return <p>{count} counted</p>;
    }
    const { user } = show(<Counting />);
    await user.keyboard('nnn');
    expect(screen.getByText('3 counted')).toBeTruthy();
  });
});

test('a button that works holds still and says so', () => {
  show(<Button busy="Posting…">Post</Button>);
  const button = screen.getByRole('button', { name: 'Posting…' }) as HTMLButtonElement;
  expect(button.disabled).toBe(true);
  expect(button.getAttribute('aria-busy')).toBe('true');
});

test('every state has its word and a drawing of its own', () => {
  const drawings = (['waiting', 'another-pass', 'cleared', 'waived'] as const).map((state) => {
    const { container, unmount } = show(<StateChip state={state} />);
    const drawing = container.querySelector('svg')?.innerHTML;
    unmount();
    return drawing;
  });
  expect(new Set(drawings).size).toBe(4);
});

test('tabs are addresses, and the one that is open says so', () => {
  show(
    <Tabs
      label="Which takes"
      tabs={[
        { to: '/p/paper-yard', label: 'Everything', current: true },
        { to: '/p/paper-yard?show=mine', label: 'Mine', current: false },
      ]}
    />,
  );
  expect(screen.getByRole('link', { name: 'Everything' }).getAttribute('aria-current')).toBe('page');
  expect(screen.getByRole('link', { name: 'Mine' }).getAttribute('href')).toBe('/p/paper-yard?show=mine');
});

test('a field says its hint and what is wrong to those who cannot see them', () => {
  show(<TextField label="First frame" hint="from the file names" error="A whole number, please." />);
  const ids = screen.getByLabelText('First frame').getAttribute('aria-describedby')!.split(' ');
  expect(ids.map((id) => document.getElementById(id)?.textContent)).toEqual([
    'from the file names',
    'A whole number, please.',
  ]);
});

test('others who are here now stand in the header, oneself does not', () => {
  const client = filledClient();
  client.setQueryData(hereOptions(SLUG).queryKey, [BRITTA, OTIS]);
  show(<HereNow slug={SLUG} me={BRITTA.id} />, { client });
  expect(screen.getByRole('img', { name: 'Otis Reed' })).toBeTruthy();
  expect(screen.queryByRole('img', { name: 'Britta Sand' })).toBeNull();
});

test('a lost line is said quietly and goes away with it', () => {
  act(() => setLineState('live'));
  show(<LineNote />);
  expect(screen.queryByText(/Reconnecting/)).toBeNull();
  act(() => setLineState('reconnecting'));
  expect(screen.getByRole('status').textContent).toBe('Reconnecting. What you write is kept.');
  act(() => setLineState('live'));
  expect(screen.queryByText(/Reconnecting/)).toBeNull();
});

test('? lists the keys of the screen, and closing it gives the focus back', async () => {
  function Screen() {
    useKeys('Picture', [{ key: 'ArrowLeft', says: 'Step back one frame', run: () => {} }]);
    return <button type="button">stay</button>;
  }
  const { user } = show(
    <>
      <Screen />
      <KeyList slug={SLUG} />
    </>,
  );
  screen.getByRole('button', { name: 'stay' }).focus();
  await user.keyboard('?');
  expect(screen.getByRole('dialog', { name: 'Keys on this screen' })).toBeTruthy();
  expect(screen.getByText('Step back one frame')).toBeTruthy();
  expect(screen.getByText('←')).toBeTruthy();
  await user.click(screen.getByRole('button', { name: 'Close' }));
  expect(screen.queryByRole('dialog')).toBeNull();
  expect(document.activeElement).toBe(screen.getByRole('button', { name: 'stay' }));
});
