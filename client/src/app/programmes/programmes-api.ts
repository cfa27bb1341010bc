import { inject, Injectable } from '@angular/core';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { listProcedures } from '@shared/procedures/procedures-contract';
import type {
  addRule,
  createProgramme,
  editEnrolment,
  editProgramme,
  editRule,
  enrol,
  findPlaces,
  listProgrammes,
  listRuleRevisions,
  previewRuleEdit,
  readProgramme,
  readRule,
  restoreProgramme,
  restoreRule,
  retireProgramme,
  retireRule,
  unenrol,
} from '@shared/programmes/programmes-contract';
import type { RuleDefinition } from '@shared/programmes/rule-definition';
import type { Asked, SentBody } from '../api/api';
import { Api } from '../api/api';

export type Programme = ReplyOf<typeof readProgramme>;
export type ProgrammeRow = ReplyOf<typeof listProgrammes>['rows'][number];
export type ProgrammeQuery = NonNullable<Asked<typeof listProgrammes>['query']>;
export type Rule = ReplyOf<typeof readRule>;
export type Enrolment = Programme['enrolments'][number];
export type ScopeKind = Enrolment['scopeKind'];
export type Reach = Programme['reach'];
export type RuleEffect = ReplyOf<typeof previewRuleEdit>;
export type ProcedureChoice = ReplyOf<typeof listProcedures>['rows'][number];
export type PlaceToEnrol = ReplyOf<typeof findPlaces>['rows'][number];

/** Everything the programmes' pages ask of the server. */
@Injectable({ providedIn: 'root' })
export class ProgrammesApi {
  private readonly api = inject(Api);

  list(query: () => ProgrammeQuery) {
    return this.api.resource<typeof listProgrammes>('/programmes', () => ({ query: query() }));
  }

  one(id: () => string | undefined) {
    return this.api.resource<typeof readProgramme>('/programmes/:id', () => {
      const asked = id();
      return asked ? { params: { id: asked } } : undefined;
    });
  }

  rule(id: () => string | undefined) {
    return this.api.resource<typeof readRule>('/rules/:id', () => {
      const asked = id();
      return asked ? { params: { id: asked } } : undefined;
    });
  }

  revisions(id: () => string | undefined) {
    return this.api.resource<typeof listRuleRevisions>('/rules/:id/revisions', () => {
      const asked = id();
      return asked ? { params: { id: asked } } : undefined;
    });
  }

  /** One rule, read now: what somebody else has made of it meanwhile. */
  readRule(id: string) {
    return this.api.call<typeof readRule>('GET', '/rules/:id', { params: { id } });
  }

  /** All procedures: those that a rule can use, and those that one once used. */
  procedures(locale: 'en' | 'es') {
    return this.api.resource<typeof listProcedures>('/procedures', () => ({
      query: { state: 'all', pageSize: 200, locale },
    }));
  }

  create(body: SentBody<typeof createProgramme>) {
    return this.api.call<typeof createProgramme>('POST', '/programmes', { body });
  }

  edit(id: string, body: SentBody<typeof editProgramme>) {
    return this.api.call<typeof editProgramme>('PATCH', '/programmes/:id', {
      params: { id },
      body,
    });
  }

  retire(id: string, version: number) {
    return this.api.call<typeof retireProgramme>('POST', '/programmes/:id/retire', {
      params: { id },
      body: { version },
    });
  }

  restore(id: string, version: number) {
    return this.api.call<typeof restoreProgramme>('POST', '/programmes/:id/restore', {
      params: { id },
      body: { version },
    });
  }

  addRule(programmeId: string, id: string, rule: RuleDefinition) {
    return this.api.call<typeof addRule>('POST', '/programmes/:id/rules', {
      params: { id: programmeId },
      body: { id, ...rule },
    });
  }

  editRule(id: string, version: number, rule: RuleDefinition) {
    return this.api.call<typeof editRule>('PUT', '/rules/:id', {
      params: { id },
      body: { version, ...rule },
    });
  }

  /** What an edit would do to the rule's tasks; changes nothing. */
  previewEdit(id: string, version: number, rule: RuleDefinition) {
    return this.api.call<typeof previewRuleEdit>('POST', '/rules/:id/preview', {
      params: { id },
      body: { version, ...rule },
    });
  }

  retireRule(id: string, version: number) {
    return this.api.call<typeof retireRule>('POST', '/rules/:id/retire', {
      params: { id },
      body: { version },
    });
  }

  restoreRule(id: string, version: number) {
    return this.api.call<typeof restoreRule>('POST', '/rules/:id/restore', {
      params: { id },
      body: { version },
    });
  }

  places(programmeId: string, kind: ScopeKind, q: string) {
    return this.api.call<typeof findPlaces>('GET', '/programmes/:id/places', {
      params: { id: programmeId },
      query: { kind, q },
    });
  }

  enrol(programmeId: string, body: SentBody<typeof enrol>) {
    return this.api.call<typeof enrol>('POST', '/programmes/:id/enrolments', {
      params: { id: programmeId },
      body,
    });
  }

  editEnrolment(id: string, body: SentBody<typeof editEnrolment>) {
    return this.api.call<typeof editEnrolment>('PATCH', '/enrolments/:id', {
      params: { id },
      body,
    });
  }

  unenrol(id: string, version: number) {
    return this.api.call<typeof unenrol>('DELETE', '/enrolments/:id', {
      params: { id },
      body: { version },
    });
  }
}
