// What an order is quoted from: dated tax rates, versions of the terms, zones and services of the post.
// Locks: none (new tables). Back: drops them; their data is lost.

type Run = (sql: string) => Promise<unknown>

const UP = `
create table tax_rates (
  id uuid default gen_random_uuid() constraint tax_rates_pkey primary key,
  workshop_id uuid,
  country text not null,
  tax_class text not null default 'standard',
  basis_points integer not null,
  valid_from date not null,
  source text not null default '',
  constraint tax_rates_workshop_id_fkey foreign key (workshop_id)
    references workshops (id) on delete restrict,
  constraint tax_rates_country_check check (country ~ '^[A-Z]{2}$'),
  constraint tax_rates_tax_class_check check (tax_class in ('standard', 'reduced', 'zero')),
  constraint tax_rates_basis_points_check check (basis_points between 0 and 10000),
  constraint tax_rates_source_check check (length(source) <= 300)
);
alter table tax_rates
  add constraint tax_rates_country_class_from_key unique nulls not distinct (workshop_id, country, tax_class, valid_from);

create table terms_versions (
  id uuid default gen_random_uuid() constraint terms_versions_pkey primary key,
  workshop_id uuid not null constraint terms_versions_workshop_id_fkey
    references workshops (id) on delete restrict,
  number integer not null,
  body text not null,
  lapse_keeps_deposit boolean not null default false,
  published_at timestamptz not null,
  published_by_person_id uuid not null,
  constraint terms_versions_number_check check (number > 0),
  constraint terms_versions_body_check check (length(body) <= 100000),
  constraint terms_versions_published_by_person_id_fkey foreign key (published_by_person_id)
    references people (id) on delete restrict,
  constraint terms_versions_workshop_id_id_key unique (workshop_id, id),
  constraint terms_versions_number_key unique (workshop_id, number)
);
create trigger terms_versions_never_changed before update or delete on terms_versions
  for each row execute function refuse_change();

create table postage_zones (
  id uuid default gen_random_uuid() constraint postage_zones_pkey primary key,
  workshop_id uuid not null constraint postage_zones_workshop_id_fkey
    references workshops (id) on delete restrict,
  name text not null,
  countries text[] not null,
  position integer not null default 0,
  constraint postage_zones_name_check check (length(name) <= 80),
  constraint postage_zones_position_check check (position >= 0),
  constraint postage_zones_workshop_id_id_key unique (workshop_id, id),
  constraint postage_zones_countries_some_check check (cardinality(countries) > 0)
);
create index postage_zones_workshop_id_idx on postage_zones (workshop_id);

create table postage_services (
  id uuid default gen_random_uuid() constraint postage_services_pkey primary key,
  workshop_id uuid not null constraint postage_services_workshop_id_fkey
    references workshops (id) on delete restrict,
  zone_id uuid not null,
  name text not null,
  kind text not null default 'parcel',
  max_grams integer not null,
  max_mm integer not null,
  bands jsonb not null,
  tracked boolean not null default true,
  insured_minor bigint not null default 0,
  claim_within_days integer,
  tracking_url text,
  position integer not null default 0,
  ended_at timestamptz,
  constraint postage_services_zone_id_fkey foreign key (workshop_id, zone_id)
    references postage_zones (workshop_id, id) on delete restrict,
  constraint postage_services_name_check check (length(name) <= 80),
  constraint postage_services_kind_check check (kind in ('letter', 'parcel')),
  constraint postage_services_max_grams_check check (max_grams > 0),
  constraint postage_services_max_mm_check check (max_mm > 0),
  constraint postage_services_insured_minor_check check (insured_minor >= 0),
  constraint postage_services_claim_within_days_check check (claim_within_days >= 0),
  constraint postage_services_tracking_url_check check (length(tracking_url) <= 300),
  constraint postage_services_position_check check (position >= 0),
  constraint postage_services_workshop_id_id_key unique (workshop_id, id),
  constraint postage_services_bands_some_check
    check (jsonb_typeof(bands) = 'array' and jsonb_array_length(bands) > 0)
);
create index postage_services_zone_id_idx on postage_services (workshop_id, zone_id);
`

const DOWN = `
drop table postage_services, postage_zones, terms_versions, tax_rates;
`

export const up = (run: Run) => run(UP)
export const down = (run: Run) => run(DOWN)
