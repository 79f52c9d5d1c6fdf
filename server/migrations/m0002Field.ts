import { shutToOthers, type Migration } from './tenantTable'

/** Outlines, rounds, beats, the frame, and what comes in from devices. */
export const m0002Field: Migration = {
  name: '20261201-0002-field',
  up: `
    CREATE TABLE district (
      organisation_id uuid NOT NULL REFERENCES organisation,
      district_id uuid NOT NULL,
      name text NOT NULL,
      geometry geometry(MultiPolygon, 4326),
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (organisation_id, district_id)
    );
    CREATE UNIQUE INDEX district_name ON district (organisation_id, lower(name));
    ${shutToOthers('district')}

    CREATE TABLE block (
      organisation_id uuid NOT NULL,
      block_id uuid NOT NULL,
      district_id uuid NOT NULL,
      name text NOT NULL,
      geometry geometry(MultiPolygon, 4326) NOT NULL,
      PRIMARY KEY (organisation_id, block_id),
      FOREIGN KEY (organisation_id, district_id) REFERENCES district
    );
    CREATE INDEX block_geometry ON block USING gist (geometry);
    ${shutToOthers('block')}

    CREATE TABLE outline_import (
      organisation_id uuid NOT NULL REFERENCES organisation,
      import_id uuid NOT NULL,
      file_name text NOT NULL,
      staged jsonb NOT NULL,
      features jsonb,
      state text NOT NULL DEFAULT 'staged' CHECK (state IN ('staged', 'imported', 'discarded')),
      created_by uuid NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (organisation_id, import_id)
    );
    ${shutToOthers('outline_import')}

    CREATE TABLE outline (
      organisation_id uuid NOT NULL,
      outline_id uuid NOT NULL,
      district_id uuid NOT NULL,
      block_id uuid,
      import_id uuid,
      reference text NOT NULL,
      street text,
      house_number text,
      footprint_m2 double precision NOT NULL CHECK (footprint_m2 > 0),
      register_year integer,
      register_storeys double precision,
      register_height_m double precision,
      register_use text,
      attributes jsonb NOT NULL DEFAULT '{}',
      geometry geometry(MultiPolygon, 4326) NOT NULL,
      inner_point geometry(Point, 4326) NOT NULL,
      PRIMARY KEY (organisation_id, outline_id),
      FOREIGN KEY (organisation_id, district_id) REFERENCES district,
      FOREIGN KEY (organisation_id, block_id) REFERENCES block
    );
    CREATE INDEX outline_geometry ON outline USING gist (geometry);
    CREATE INDEX outline_district ON outline (organisation_id, district_id);
    CREATE UNIQUE INDEX outline_reference ON outline (organisation_id, district_id, reference);
    ${shutToOthers('outline')}

    CREATE TABLE round (
      organisation_id uuid NOT NULL,
      round_id uuid NOT NULL,
      district_id uuid NOT NULL,
      name text NOT NULL,
      starts_on date NOT NULL,
      ends_on date NOT NULL CHECK (ends_on >= starts_on),
      created_by uuid NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (organisation_id, round_id),
      FOREIGN KEY (organisation_id, district_id) REFERENCES district
    );
    ${shutToOthers('round')}

    CREATE TABLE beat (
      organisation_id uuid NOT NULL,
      beat_id uuid NOT NULL,
      round_id uuid NOT NULL,
      name text NOT NULL,
      surveyor_id uuid,
      change_no bigint NOT NULL,
      deleted_at timestamptz,
      PRIMARY KEY (organisation_id, beat_id),
      FOREIGN KEY (organisation_id, round_id) REFERENCES round,
      FOREIGN KEY (organisation_id, surveyor_id) REFERENCES person
    );
    CREATE INDEX beat_surveyor ON beat (organisation_id, surveyor_id);
    ${shutToOthers('beat')}

    CREATE TABLE round_building (
      organisation_id uuid NOT NULL,
      building_id uuid NOT NULL,
      round_id uuid NOT NULL,
      outline_id uuid NOT NULL,
      beat_id uuid,
      change_no bigint NOT NULL,
      PRIMARY KEY (organisation_id, building_id),
      UNIQUE (organisation_id, round_id, outline_id),
      FOREIGN KEY (organisation_id, round_id) REFERENCES round,
      FOREIGN KEY (organisation_id, outline_id) REFERENCES outline,
      FOREIGN KEY (organisation_id, beat_id) REFERENCES beat
    );
    CREATE INDEX round_building_scope ON round_building (organisation_id, beat_id, change_no);
    ${shutToOthers('round_building')}

    CREATE TABLE sheet (
      organisation_id uuid NOT NULL,
      sheet_id uuid NOT NULL,
      round_id uuid NOT NULL,
      beat_id uuid,
      outline_id uuid,
      answers jsonb NOT NULL DEFAULT '{}',
      /* group → change number of its last write, and group → device of its last write */
      versions jsonb NOT NULL DEFAULT '{}',
      writers jsonb NOT NULL DEFAULT '{}',
      state text NOT NULL CHECK (state IN ('handed-in', 'checked', 'sent-back')),
      revision integer NOT NULL DEFAULT 1,
      question text,
      reviewed_by uuid,
      reviewed_at timestamptz,
      recorded_by uuid NOT NULL,
      recorded_at timestamptz NOT NULL DEFAULT now(),
      change_no bigint NOT NULL,
      deleted_at timestamptz,
      /* derived from answers at each write, for aggregation */
      finding text NOT NULL DEFAULT 'standing',
      use text NOT NULL DEFAULT 'unknown',
      structure text NOT NULL DEFAULT 'unknown',
      year_from integer,
      year_to integer,
      footprint_m2 double precision,
      gross_floor_area_m2 double precision,
      floor_area_cv double precision,
      PRIMARY KEY (organisation_id, sheet_id),
      FOREIGN KEY (organisation_id, round_id) REFERENCES round,
      FOREIGN KEY (organisation_id, outline_id) REFERENCES outline,
      FOREIGN KEY (organisation_id, recorded_by) REFERENCES person
    );
    CREATE INDEX sheet_scope ON sheet (organisation_id, beat_id, change_no);
    CREATE INDEX sheet_round ON sheet (organisation_id, round_id, state);
    ${shutToOthers('sheet')}

    CREATE TABLE sheet_revision (
      organisation_id uuid NOT NULL,
      sheet_id uuid NOT NULL,
      revision integer NOT NULL,
      state text NOT NULL,
      answers jsonb NOT NULL,
      by_person uuid NOT NULL,
      at timestamptz NOT NULL DEFAULT now(),
      change_no bigint NOT NULL,
      PRIMARY KEY (organisation_id, sheet_id, change_no),
      FOREIGN KEY (organisation_id, sheet_id) REFERENCES sheet
    );
    ${shutToOthers('sheet_revision', 'SELECT, INSERT, DELETE')}

    CREATE TABLE photo (
      organisation_id uuid NOT NULL,
      photo_id uuid NOT NULL,
      sheet_id uuid NOT NULL,
      beat_id uuid,
      sha256 text NOT NULL,
      bytes integer NOT NULL,
      mime text NOT NULL,
      width_px integer NOT NULL,
      height_px integer NOT NULL,
      tag text NOT NULL,
      taken_at timestamptz,
      state text NOT NULL CHECK (state IN ('declared', 'partial', 'stored', 'refused')),
      refusal text,
      stored_sha256 text,
      taken_by uuid NOT NULL,
      change_no bigint NOT NULL,
      deleted_at timestamptz,
      PRIMARY KEY (organisation_id, photo_id)
    );
    CREATE INDEX photo_sheet ON photo (organisation_id, sheet_id);
    CREATE INDEX photo_scope ON photo (organisation_id, beat_id, change_no);
    ${shutToOthers('photo')}

    CREATE TABLE applied_mutation (
      organisation_id uuid NOT NULL,
      mutation_id uuid NOT NULL,
      device_id uuid NOT NULL,
      seq bigint NOT NULL,
      payload_sha256 text NOT NULL,
      outcome text NOT NULL CHECK (outcome IN ('applied', 'rejected', 'blocked')),
      change_no bigint,
      problem jsonb,
      at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (organisation_id, mutation_id)
    );
    CREATE TABLE applied_sequence (
      organisation_id uuid NOT NULL,
      device_id uuid NOT NULL,
      seq bigint NOT NULL,
      mutation_id uuid NOT NULL,
      payload_sha256 text NOT NULL,
      PRIMARY KEY (organisation_id, device_id, seq)
    );
    ${shutToOthers('applied_mutation')}
    ${shutToOthers('applied_sequence')}

    CREATE TABLE conflict (
      organisation_id uuid NOT NULL,
      conflict_id uuid NOT NULL,
      sheet_id uuid NOT NULL,
      beat_id uuid,
      field_group text NOT NULL,
      kept jsonb,
      set_aside jsonb,
      kept_by uuid,
      set_aside_by uuid,
      state text NOT NULL CHECK (state IN ('open', 'settled')),
      settled_by uuid,
      settled_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      change_no bigint NOT NULL,
      PRIMARY KEY (organisation_id, conflict_id)
    );
    CREATE INDEX conflict_sheet ON conflict (organisation_id, sheet_id);
    CREATE INDEX conflict_scope ON conflict (organisation_id, beat_id, change_no);
    ${shutToOthers('conflict')}

    CREATE TABLE quarantine (
      organisation_id uuid NOT NULL,
      mutation_id uuid NOT NULL,
      device_id uuid NOT NULL,
      person_id uuid NOT NULL,
      reason jsonb NOT NULL,
      payload jsonb NOT NULL,
      received_at timestamptz NOT NULL DEFAULT now(),
      state text NOT NULL DEFAULT 'waiting' CHECK (state IN ('waiting', 'released', 'discarded')),
      PRIMARY KEY (organisation_id, mutation_id)
    );
    ${shutToOthers('quarantine')}

    CREATE TABLE scope_exit (
      organisation_id uuid NOT NULL,
      beat_id uuid NOT NULL,
      entity_type text NOT NULL,
      entity_id uuid NOT NULL,
      change_no bigint NOT NULL,
      PRIMARY KEY (organisation_id, beat_id, entity_type, entity_id, change_no)
    );
    ${shutToOthers('scope_exit')}
  `,
  down: `
    DROP TABLE scope_exit, quarantine, conflict, applied_sequence, applied_mutation, photo, sheet_revision, sheet,
      round_building, beat, round, outline, outline_import, block, district;
  `,
}
