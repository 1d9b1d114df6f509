import { Injectable } from '@nestjs/common';
import { EntityManager } from '@mikro-orm/postgresql';
import { ScopeRefused, withScope } from '@quarterpoise/database';
import { type Hat, HATS, type Language, type SessionView } from '@quarterpoise/dto';
import type { CurrentPerson } from '../platform/access/current-person.decorator.js';

export interface Credentials {
  readonly personId: string;
  readonly passwordHash: string;
  readonly isDisabled: boolean;
}

/** What signing in needs to know. Before anybody is signed in there is no scope, only two narrow functions of the database. */
@Injectable()
export class IdentityReader {
  constructor(private readonly em: EntityManager) {}

  async credentialsOf(email: string): Promise<Credentials | null> {
    const [row] = await this.em
      .fork()
      .execute<{ person_id: string; password_hash: string; is_disabled: boolean }[]>(
        'select person_id, password_hash, is_disabled from app.credentials_of(?)',
        [email],
      );
    return row ? { personId: row.person_id, passwordHash: row.password_hash, isDisabled: row.is_disabled } : null;
  }

  /** The hats of a person in the order in which they are offered. */
  async hatsOf(personId: string): Promise<Hat[]> {
    const rows = await this.em
      .fork()
      .execute<{ hat: string }[]>('select hat from app.hats_of(?) as held(hat)', [personId]);
    const held = new Set(rows.map((row) => row.hat));
    return HATS.filter((hat) => held.has(hat));
  }

  /** Who is signed in, read afresh; null when the person is switched off or no longer holds the hat. */
  async sessionView(person: CurrentPerson, csrfToken: string): Promise<SessionView | null> {
    const hats = await this.hatsOf(person.personId);
    try {
      const row = await withScope(this.em, person, async (tx) => {
        const [own] = await tx.execute<{ display_name: string; email: string; language: Language }[]>(
          'select display_name, email, language from person where id = ?',
          [person.personId],
        );
        return own;
      });
      if (!row) return null;
      return {
        person: { id: person.personId, displayName: row.display_name, email: row.email, language: row.language },
        hat: person.hat,
        hats,
        csrfToken,
      };
    } catch (error) {
      if (error instanceof ScopeRefused) return null;
      throw error;
    }
  }

  async chooseLanguage(person: CurrentPerson, language: Language): Promise<void> {
    await withScope(this.em, person, (tx) =>
      tx.execute('update person set language = ? where id = ?', [language, person.personId]),
    );
  }
}
