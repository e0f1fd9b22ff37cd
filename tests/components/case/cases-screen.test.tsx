import { fireEvent, screen, waitFor } from '@testing-library/react';
import { CasesScreen } from '@/components/case/list/cases-screen';
import { answerWith, problem, type Answer } from '../network';
import { show } from '../stage';

const counts = { reported: 2, 'under-investigation': 5, 'awaiting-sign-off': 1, closed: 137 };
const empty = { cases: [], total: 0, counts };

const answering = (list: Answer | null) =>
  answerWith(({ address }) =>
    address.startsWith('/api/cases')
      ? list
      : address.startsWith('/api/scanners')
        ? { json: [] }
        : problem(401, 'not-signed-in', 'Sign in first'),
  );

describe('the cases', () => {
  test('of another state are a word in the address', async () => {
    answering({ json: empty });
    const onParams = jest.fn();
    show(<CasesScreen params={{ q: 'ghost' }} onParams={onParams} />);
    fireEvent.click(await screen.findByRole('tab', { name: 'closed 137' }));
    expect(onParams).toHaveBeenCalledWith(expect.objectContaining({ state: 'closed', q: 'ghost' }));
  });

  test('are asked for as the address says', async () => {
    const asked = answering({ json: empty });
    show(<CasesScreen params={{ state: 'closed', seen: 'ghosts' }} onParams={() => undefined} />);
    await waitFor(() =>
      expect(asked.map(({ address }) => address)).toContain('/api/cases?state=closed&seen=ghosts&order=age&descending=false&limit=50'),
    );
  });

  test('count as open what is not closed', async () => {
    answering({ json: empty });
    show(<CasesScreen params={{}} onParams={() => undefined} />);
    expect(await screen.findByRole('tab', { name: 'open 8' })).toBeTruthy();
  });

  test('that do not come are a sentence with a way to try again', async () => {
    let away = true;
    answerWith(({ address }) =>
      address.startsWith('/api/cases')
        ? away
          ? problem(503, 'database-away', 'The database is not reachable')
          : { json: empty }
        : { json: [] },
    );
    show(<CasesScreen params={{}} onParams={() => undefined} />);
    expect((await screen.findByRole('alert', {}, { timeout: 8000 })).textContent).toContain('The database is not reachable');
    away = false;
    fireEvent.click(screen.getByRole('button', { name: 'again' }));
    expect(await screen.findByText('No case is open.')).toBeTruthy();
  }, 15_000);

  test('under filters that fit none offer the way out of the filters', async () => {
    answering({ json: empty });
    const onParams = jest.fn();
    show(<CasesScreen params={{ seen: 'noise' }} onParams={onParams} />);
    fireEvent.click(await screen.findByRole('button', { name: 'show all' }));
    expect(onParams).toHaveBeenCalledWith(expect.objectContaining({ seen: undefined, q: undefined }));
  });
});
