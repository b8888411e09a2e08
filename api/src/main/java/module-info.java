/** Forms, models, lowering, audits, and the interface between a caller and a sampler. */
module dev.couplet.api {
  requires static org.jspecify;

  exports dev.couplet.audit;
  exports dev.couplet.form;
  exports dev.couplet.lower;
  exports dev.couplet.model;
  exports dev.couplet.sampling;
}
