import type { Sequelize } from 'sequelize';
import { associate } from './associations';
import { initAttachment } from './attachment';
import { initCategory } from './category';
import { initCategoryMode } from './category-mode';
import { initCategoryRevision } from './category-revision';
import { initClaim } from './claim';
import { initClaimRevision } from './claim-revision';
import { initCredentialToken } from './credential-token';
import { initDevice } from './device';
import { initDeviceAlias } from './device-alias';
import { initEvent } from './event';
import { initFigureScope } from './figure-scope';
import { initIdempotencyKey } from './idempotency-key';
import { initInstrument } from './instrument';
import { initInstrumentRevision } from './instrument-revision';
import { initMaker } from './maker';
import { initMember } from './member';
import { initMethod } from './method';
import { initMethodRevision } from './method-revision';
import { initOperatingMode } from './operating-mode';
import { initOutbox } from './outbox';
import { initPersonalDetail } from './personal-detail';
import { initPhase } from './phase';
import { initPhaseTrace } from './phase-trace';
import { initPublishedFigure } from './published-figure';
import { initPublishedFigureHistory } from './published-figure-history';
import { initPublishedFigureInput } from './published-figure-input';
import { initReport } from './report';
import { initReportDraft } from './report-draft';
import { initReportFigure } from './report-figure';
import { initReportRevision } from './report-revision';
import { initReportRevisionAttachment } from './report-revision-attachment';
import { initReportRevisionTrace } from './report-revision-trace';
import { initReview } from './review';
import { initReviewRemark } from './review-remark';
import { initSession } from './session';
import { initSetAside } from './set-aside';
import { initSlug } from './slug';
import { initTrace } from './trace';
import { initTraceUpload } from './trace-upload';
import { initUnit } from './unit';
import { initVariant } from './variant';

/**
 * Initialises every model on one Sequelize instance and associates them. The bundler makes two copies of these files
 * (pages and route handlers), so code takes the classes from `database()` and imports them from here as types only.
 */
export function initialiseModels(sequelize: Sequelize) {
  const models = {
    Attachment: initAttachment(sequelize),
    Category: initCategory(sequelize),
    CategoryMode: initCategoryMode(sequelize),
    CategoryRevision: initCategoryRevision(sequelize),
    Claim: initClaim(sequelize),
    ClaimRevision: initClaimRevision(sequelize),
    CredentialToken: initCredentialToken(sequelize),
    Device: initDevice(sequelize),
    DeviceAlias: initDeviceAlias(sequelize),
    Event: initEvent(sequelize),
    FigureScope: initFigureScope(sequelize),
    IdempotencyKey: initIdempotencyKey(sequelize),
    Instrument: initInstrument(sequelize),
    InstrumentRevision: initInstrumentRevision(sequelize),
    Maker: initMaker(sequelize),
    Member: initMember(sequelize),
    Method: initMethod(sequelize),
    MethodRevision: initMethodRevision(sequelize),
    OperatingMode: initOperatingMode(sequelize),
    Outbox: initOutbox(sequelize),
    PersonalDetail: initPersonalDetail(sequelize),
    Phase: initPhase(sequelize),
    PhaseTrace: initPhaseTrace(sequelize),
    PublishedFigure: initPublishedFigure(sequelize),
    PublishedFigureHistory: initPublishedFigureHistory(sequelize),
    PublishedFigureInput: initPublishedFigureInput(sequelize),
    Report: initReport(sequelize),
    ReportDraft: initReportDraft(sequelize),
    ReportFigure: initReportFigure(sequelize),
    ReportRevision: initReportRevision(sequelize),
    ReportRevisionAttachment: initReportRevisionAttachment(sequelize),
    ReportRevisionTrace: initReportRevisionTrace(sequelize),
    Review: initReview(sequelize),
    ReviewRemark: initReviewRemark(sequelize),
    Session: initSession(sequelize),
    SetAside: initSetAside(sequelize),
    Slug: initSlug(sequelize),
    Trace: initTrace(sequelize),
    TraceUpload: initTraceUpload(sequelize),
    Unit: initUnit(sequelize),
    Variant: initVariant(sequelize),
  };
  associate(models);
  return models;
}

export type Models = ReturnType<typeof initialiseModels>;
