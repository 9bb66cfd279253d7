import type { Sequelize } from 'sequelize';
import { defineLaboratory, definePerson, defineSession, definePasswordLink, defineApiToken } from './people';
import { defineNotebook, defineMembership, defineShareLink, defineShareSession } from './notebooks';
import { defineSourceFile, defineSpectrum } from './spectra';
import { defineMethod, defineCurve, defineStandard } from './curves';
import { defineAbsorptivity } from './absorptivities';
import { defineBatch, defineDetermination, defineReading } from './batches';
import { defineRecordEntry } from './record-entry';

/** Every model of one connection. Models belong to the connection, so they are made with it. */
export function defineModels(sequelize: Sequelize) {
  return {
    Laboratory: defineLaboratory(sequelize),
    Person: definePerson(sequelize),
    Session: defineSession(sequelize),
    PasswordLink: definePasswordLink(sequelize),
    ApiToken: defineApiToken(sequelize),
    Notebook: defineNotebook(sequelize),
    Membership: defineMembership(sequelize),
    ShareLink: defineShareLink(sequelize),
    ShareSession: defineShareSession(sequelize),
    SourceFile: defineSourceFile(sequelize),
    Spectrum: defineSpectrum(sequelize),
    Method: defineMethod(sequelize),
    Curve: defineCurve(sequelize),
    Standard: defineStandard(sequelize),
    Absorptivity: defineAbsorptivity(sequelize),
    Batch: defineBatch(sequelize),
    Determination: defineDetermination(sequelize),
    Reading: defineReading(sequelize),
    RecordEntry: defineRecordEntry(sequelize),
  };
}

export type Models = ReturnType<typeof defineModels>;
