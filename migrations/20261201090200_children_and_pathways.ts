import type { Knex } from 'knex';

export const up = async (db: Knex): Promise<void> => {
  for (const statement of [
    `create table protocols (
      version integer primary key,
      name text not null,
      document text not null,
      status text not null check (status in ('draft','active','retired')),
      changes text not null,
      created_at text not null,
      created_by_id text references members (id),
      activated_at text,
      activated_by_id text references members (id),
      agreed_by text
    ) strict`,
    `create unique index protocols_one_active on protocols (status) where status = 'active'`,
    `create table children (
      id text primary key,
      version integer not null,
      pathway_version integer not null,
      first_name text not null,
      family_name text not null,
      record_number text not null unique,
      search_text text not null,
      born_on text,
      due_on text,
      is_birth_estimated integer not null check (is_birth_estimated in (0, 1)),
      gestation_days integer,
      sex text not null check (sex in ('female','male','unknown')),
      cleft text not null,
      is_cleft_provisional integer not null check (is_cleft_provisional in (0, 1)),
      flags text not null,
      syndromes text not null,
      referred_on text,
      prenatal_referral_on text,
      team_start_on text,
      site text not null,
      lead_clinician_id text references members (id),
      contacts text not null,
      alerts text not null,
      notes text not null,
      protocol_version integer not null references protocols (version),
      transferred_on text,
      transferred_to text,
      care_ended_on text,
      care_ended_reason text,
      registered_at text not null
    ) strict`,
    `create index children_family_name on children (family_name, first_name, id)`,
    `create index children_search on children (search_text, id)`,
    `create index children_born_on on children (born_on, id)`,
    `create index children_protocol on children (protocol_version)`,
    `create table assignments (
      child_id text not null references children (id),
      member_id text not null references members (id),
      primary key (child_id, member_id)
    ) strict`,
    `create index assignments_member on assignments (member_id)`,
    `create table claims (
      child_id text not null references children (id),
      milestone text not null,
      part text not null,
      member_id text not null references members (id),
      since text not null,
      primary key (child_id, milestone, part)
    ) strict`,
    `create index claims_member on claims (member_id)`,
    `create table drafts (
      child_id text not null references children (id),
      milestone text not null,
      part text not null,
      occurrence integer not null,
      version integer not null,
      evidence text not null,
      performed_on text,
      by_id text not null references members (id),
      at text not null,
      is_ready integer not null check (is_ready in (0, 1)),
      primary key (child_id, milestone, part)
    ) strict`,
    `create index drafts_by on drafts (by_id)`,
    `create table signatures (
      id text primary key,
      child_id text not null references children (id),
      milestone text not null,
      part text not null,
      occurrence integer not null,
      performed_on text not null,
      signed_at text not null,
      signed_on text not null,
      signer_id text not null references members (id),
      signer_name text not null,
      signer_role text not null,
      meaning text not null,
      evidence text not null,
      drafted_by_id text references members (id),
      drafted_by_name text,
      overrides text not null,
      protocol_version integer not null references protocols (version),
      digest text not null,
      signed_text text,
      previous_digest text not null,
      amends text references signatures (id),
      amend_reason text
    ) strict`,
    `create index signatures_child on signatures (child_id, milestone, occurrence)`,
    `create index signatures_signer on signatures (signer_id, signed_at)`,
    // Two people who sign the same part of the same occurrence at once: the second is refused by the database itself.
    `create unique index signatures_once on signatures (child_id, milestone, occurrence, part) where amends is null`,
    ...['update', 'delete'].map(
      (verb) =>
        `create trigger signatures_no_${verb} before ${verb} on signatures begin select raise(abort, 'a signature is final'); end`,
    ),
    // "insert or replace" deletes without firing the triggers above.
    `create trigger signatures_no_replace before insert on signatures when exists (select 1 from signatures where id = new.id) begin select raise(abort, 'a signature is final'); end`,
    `create table imported_completions (
      child_id text not null references children (id),
      milestone text not null,
      performed_on text not null,
      date_precision text not null check (date_precision in ('day','month','year')),
      is_unverified integer not null check (is_unverified in (0, 1)),
      results text not null,
      source text not null,
      primary key (child_id, milestone, performed_on)
    ) strict`,
    `create table holds (
      child_id text not null references children (id),
      milestone text not null,
      reason text not null,
      held_on text not null,
      review_on text not null,
      by_id text not null references members (id),
      primary key (child_id, milestone)
    ) strict`,
    `create table waivers (
      id text primary key,
      child_id text not null references children (id),
      milestone text not null,
      occurrence integer not null,
      kind text not null check (kind in ('waived','not-recoverable')),
      reason text not null,
      note text not null,
      second_name text,
      offer_again_on text,
      waived_on text not null,
      by_id text not null references members (id)
    ) strict`,
    `create index waivers_child on waivers (child_id, milestone)`,
    `create table bookings (
      child_id text not null references children (id),
      milestone text not null,
      booked_on text not null,
      primary key (child_id, milestone)
    ) strict`,
    `create table findings (
      child_id text not null references children (id),
      name text not null,
      found_on text not null,
      note text not null,
      primary key (child_id, name)
    ) strict`,
    `create table own_milestones (
      child_id text not null references children (id),
      id text not null,
      rule text not null,
      added_on text not null,
      primary key (child_id, id)
    ) strict`,
    `create table imports (
      id text primary key,
      file_name text not null,
      digest text not null,
      preview text not null,
      rows text not null,
      status text not null check (status in ('previewed','accepted')),
      by_id text not null references members (id),
      at text not null,
      base_version integer not null
    ) strict`,
    // The projection: what the board reads. It can be thrown away and made again from the facts.
    `create table board_rows (
      child_id text not null references children (id),
      milestone text not null,
      milestone_id text not null,
      lane text not null,
      state text not null check (state in ('ahead','open','closing','late','waiting','held','partly-signed','signed','waived','transferred')),
      is_due integer not null,
      squeezed_days integer,
      is_lapsed integer not null,
      occurrence integer not null,
      earliest text,
      target text,
      latest text,
      closing text,
      changes_on text,

      owners text not null,
      is_unowned integer not null,
      is_on_board integer not null,
      primary key (child_id, milestone)
    ) strict`,
    `create index board_rows_shown on board_rows (is_on_board, child_id)`,
    `create index board_rows_changes on board_rows (changes_on)`,
    `create index board_rows_state on board_rows (state, latest)`,
    `create table board_children (
      child_id text primary key references children (id),
      changed_at_version integer not null
    ) strict`,
    `create index board_children_changed on board_children (changed_at_version)`,
    `create table board_counter (id integer primary key check (id = 1), version integer not null, rolled_on text not null) strict`,
    `insert into board_counter (id, version, rolled_on) values (1, 0, '')`,
  ]) {
    await db.raw(statement);
  }
};

export const down = async (db: Knex): Promise<void> => {
  for (const table of [
    'board_counter',
    'board_children',
    'board_rows',
    'imports',
    'own_milestones',
    'findings',
    'bookings',
    'waivers',
    'holds',
    'imported_completions',
    'signatures',
    'drafts',
    'claims',
    'assignments',
    'children',
    'protocols',
  ]) {
    await db.schema.dropTable(table);
  }
};
