import { describe, expect, it } from 'vitest';
import { offerMessage, type OfferNotice } from '@/src/mail/offer-message';

const notice: OfferNotice = {
  kind: 'offer',
  sessionCode: 'ARC-031',
  title: 'North arc, 22 GHz',
  number: 7,
  stationCode: 'Cf',
  stationName: 'Cinder Flat',
  from: '2027-02-12 (043) 20:00:00 UT',
  until: '2027-02-13 (044) 06:54:00 UT',
  localFrom: '2027-02-12 22:00 Africa/Gaborone',
  localUntil: '2027-02-13 08:54 Africa/Gaborone',
  scans: 38,
  mode: '22 GHz',
  answerBy: '2027-02-11 (042) 12:00:00 UT',
  note: 'Bring <two> disks.',
  link: 'http://localhost:3000/sessions/ARC-031/slots',
};

describe('the message of an offer', () => {
  it('names session, version and what it means for the station in its subject', async () => {
    expect((await offerMessage(notice)).subject).toBe('ARC-031 offer 7: can Cf observe?');
    expect((await offerMessage({ ...notice, kind: 'publish' })).subject).toBe(
      'ARC-031 version 7: the plan for Cf is published',
    );
  });

  it('says the same in plain text as in its page', async () => {
    const { text, html } = await offerMessage(notice);
    const read = html.replace(/<!-- -->/g, '');
    for (const words of [notice.from, notice.localUntil, notice.answerBy ?? '', notice.link]) {
      expect(text).toContain(words);
      expect(read).toContain(words);
    }
    expect(text).toContain('You are asked for 38 scans of ARC-031 North arc, 22 GHz');
    expect(text.split('\n')[0]).toBe('A slot is offered to Cinder Flat');
  });

  it('carries a note as words, never as markup', async () => {
    const { text, html } = await offerMessage(notice);
    expect(text).toContain('Bring <two> disks.');
    expect(html).toContain('Bring &lt;two&gt; disks.');
  });

  it('leaves out what was not said', async () => {
    const { text } = await offerMessage({ ...notice, note: '', answerBy: null, scans: 1 });
    expect(text).toContain('asked for 1 scan of');
    expect(text).not.toContain('Answer by');
    expect(text).not.toMatch(/\n\n\n/);
  });
});
