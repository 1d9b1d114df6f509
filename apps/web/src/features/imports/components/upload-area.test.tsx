import { act, fireEvent, screen } from '@testing-library/react';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { importView, uuid } from '../../../testing/builders';
import { fakeApi } from '../../../testing/fake-api';
import { fakeEventSource } from '../../../testing/fake-event-source';
import { renderScreen } from '../../../testing/render-screen';
import { UploadArea } from './upload-area';

/** An upload whose progress and answer the test gives. */
class FakeUpload {
  static sent: FakeUpload[] = [];
  readonly upload: { onprogress?: (event: unknown) => void } = {};
  readonly headers: Record<string, string> = {};
  address = '';
  form = new FormData();
  status = 0;
  responseText = '';
  onload?: () => void;
  onabort?: () => void;

  open(_method: string, address: string) {
    this.address = address;
  }

  setRequestHeader(name: string, value: string) {
    this.headers[name] = value;
  }

  getResponseHeader() {
    return null;
  }

  send(form: FormData) {
    this.form = form;
    FakeUpload.sent.push(this);
  }

  abort() {
    this.onabort?.();
  }

  answer(status: number, body: unknown) {
    this.status = status;
    this.responseText = JSON.stringify(body);
    return act(async () => this.onload?.());
  }
}

beforeEach(() => {
  FakeUpload.sent = [];
  vi.stubGlobal('XMLHttpRequest', FakeUpload);
  fakeEventSource();
});

const onChanged = vi.fn();

function choose(name: string) {
  renderScreen(
    <UploadArea planId={uuid(10)} quarterId={uuid(20)} filePath={(id) => `/files/${id}`} onChanged={onChanged} />,
  );
  const file = new File(['reference,amount\n'], name, { type: 'text/csv' });
  fireEvent.change(screen.getByLabelText('Files to upload'), { target: { files: [file] } });
}

const type = (label: string, value: string) => fireEvent.change(screen.getByLabelText(label), { target: { value } });
const press = async () => {
  fireEvent.click(screen.getByRole('button', { name: 'Upload and check' }));
  await act(() => Promise.resolve());
};

describe('uploading a file', () => {
  it('asks for the control totals before anything is sent', async () => {
    fakeApi({});
    choose('2026-Q3-activity.csv');
    await press();
    expect(await screen.findByText(/Enter the number of rows/)).toBeTruthy();
    expect(screen.getByText(/Enter the sum that came with the file/)).toBeTruthy();
    expect(FakeUpload.sent).toHaveLength(0);
  });

  it('asks a roster for rows only', () => {
    fakeApi({});
    choose('roster.csv');
    expect(screen.queryByLabelText('Sum of amounts stated')).toBeNull();
    expect(screen.queryByLabelText('Sum of balances stated')).toBeNull();
  });

  it('sends the fields before the file, shows the progress and then follows the check', async () => {
    fakeApi({ 'imports.view': () => importView({ state: 'checking', progress: 0.1, counted: null, changes: null }) });
    choose('2026-Q3-activity.csv');
    type('Rows stated by the sender', '1,200');
    type('Sum of amounts stated', '$450,000.00');
    await press();
    await vi.waitFor(() => expect(FakeUpload.sent).toHaveLength(1));
    const [upload] = FakeUpload.sent;
    expect([...(upload?.form.keys() ?? [])]).toEqual(['kind', 'quarterId', 'statedRows', 'statedSum', 'file']);
    expect(upload?.form.get('statedRows')).toBe('1200');
    expect(upload?.form.get('statedSum')).toBe('450000.00');
    expect(upload?.headers['x-csrf-token']).toBe('csrf-1');
    act(() => upload?.upload.onprogress?.({ lengthComputable: true, loaded: 1, total: 4 }));
    expect(screen.getByRole('progressbar').getAttribute('aria-valuenow')).toBe('25');
    await upload?.answer(202, importView({ state: 'received', progress: 0, counted: null, changes: null }));
    expect(await screen.findByRole('progressbar', { name: 'Checking the file' })).toBeTruthy();
    expect(onChanged).toHaveBeenCalled();
  });

  it('shows a refusal at the file and lets the totals be mended', async () => {
    fakeApi({});
    choose('2026-Q3-activity.csv');
    type('Rows stated by the sender', '1200');
    type('Sum of amounts stated', '450000');
    await press();
    await vi.waitFor(() => expect(FakeUpload.sent).toHaveLength(1));
    await FakeUpload.sent[0]?.answer(422, { code: 'import-not-text', detail: 'The file begins like a ZIP archive.' });
    const alert = await screen.findByRole('alert');
    expect(alert.textContent).toContain('This is not a CSV text file');
    expect(alert.textContent).toContain('Save the file as CSV (UTF-8)');
    expect((screen.getByLabelText('Rows stated by the sender') as HTMLInputElement).value).toBe('1200');
  });
});
