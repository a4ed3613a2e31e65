// What a release's sittings came to is read by the release.
module.exports = {
  up: (q) => q.sequelize.query("CREATE INDEX sittings_by_release ON sittings (release_id)"),
  down: (q) => q.sequelize.query("DROP INDEX sittings_by_release"),
};
