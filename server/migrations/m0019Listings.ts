import { shutToOthers, type Migration } from './tenantTable'

/** Buildings with a known day of demolition, and what contractors found and weighed. */
export const m0019Listings: Migration = {
  name: '20261201-0019-listings',
  up: `
    CREATE TABLE listing (
      organisation_id uuid NOT NULL,
      listing_id uuid NOT NULL,
      run_id uuid NOT NULL,
      building_id uuid NOT NULL,
      label text NOT NULL,
      comes_down_on date NOT NULL,
      note text,
      inventory jsonb NOT NULL,
      listed_by uuid NOT NULL,
      listed_at timestamptz NOT NULL DEFAULT now(),
      withdrawn_by uuid,
      withdrawn_at timestamptz,
      withdrawal_reason text,
      PRIMARY KEY (organisation_id, listing_id),
      FOREIGN KEY (organisation_id, run_id) REFERENCES run,
      FOREIGN KEY (organisation_id, listed_by) REFERENCES person,
      FOREIGN KEY (organisation_id, withdrawn_by) REFERENCES person
    );
    ${shutToOthers('listing', 'SELECT, INSERT, UPDATE')}

    CREATE TABLE listing_recipient (
      organisation_id uuid NOT NULL,
      listing_id uuid NOT NULL,
      person_id uuid NOT NULL,
      PRIMARY KEY (organisation_id, listing_id, person_id),
      FOREIGN KEY (organisation_id, listing_id) REFERENCES listing,
      FOREIGN KEY (organisation_id, person_id) REFERENCES person
    );
    ${shutToOthers('listing_recipient', 'SELECT, INSERT')}

    CREATE TABLE listing_finding (
      organisation_id uuid NOT NULL,
      finding_id uuid NOT NULL,
      listing_id uuid NOT NULL,
      person_id uuid NOT NULL,
      at timestamptz NOT NULL DEFAULT now(),
      text text NOT NULL,
      PRIMARY KEY (organisation_id, finding_id),
      FOREIGN KEY (organisation_id, listing_id) REFERENCES listing,
      FOREIGN KEY (organisation_id, person_id) REFERENCES person
    );
    CREATE INDEX listing_finding_listing ON listing_finding (organisation_id, listing_id);
    ${shutToOthers('listing_finding', 'SELECT, INSERT')}

    CREATE TABLE weighbridge_ticket (
      organisation_id uuid NOT NULL,
      listing_id uuid NOT NULL,
      person_id uuid NOT NULL,
      position integer NOT NULL,
      weighed_on date NOT NULL,
      waste_code text NOT NULL,
      mass_kg double precision NOT NULL CHECK (mass_kg > 0),
      PRIMARY KEY (organisation_id, listing_id, person_id, position),
      FOREIGN KEY (organisation_id, listing_id) REFERENCES listing,
      FOREIGN KEY (organisation_id, person_id) REFERENCES person
    );
    ${shutToOthers('weighbridge_ticket')}
  `,
  down: `
    DROP TABLE weighbridge_ticket, listing_finding, listing_recipient, listing;
  `,
}
