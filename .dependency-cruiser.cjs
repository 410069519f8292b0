/** Arrows between the parts of app/ go one way. DEVELOPERS.md draws them. */

/** What may be imported from each part, besides itself and packages. */
const arrows = {
  domain: [],
  documents: ["domain"],
  workers: ["documents", "domain"],
  models: ["domain"],
  services: ["models", "workers", "documents", "domain"],
  components: ["workers", "domain"],
  routes: ["services", "models", "components", "domain"],
  launch: ["services", "models", "domain"],
};

const within = (parts) => `^app/(${parts.join("|")})/`;
const project = "^(app|migrations|tests)/|^[^/]+[.]ts$";

const oneWay = Object.entries(arrows).map(([part, to]) => ({
  name: `${part}-reaches-too-far`,
  comment: `app/${part} may import ${["itself", ...to].join(", ")} and packages, and nothing else of the project's.`,
  severity: "error",
  from: { path: within([part]) },
  to: { path: project, pathNot: [within([part, ...to]), ...(part === "launch" ? ["^knexfile[.]ts$"] : [])] },
}));

module.exports = {
  forbidden: [
    ...oneWay,
    {
      name: "domain-is-pure",
      comment:
        "The domain imports tonal, zod and fractional-indexing alone: no I/O, clock, randomness or React.",
      severity: "error",
      from: { path: "^app/domain/" },
      to: {
        dependencyTypesNot: ["local", "localmodule", "aliased", "aliased-subpath-import"],
        pathNot: ["^app/domain/", "^node_modules/(tonal|@tonaljs|zod|fractional-indexing)/"],
      },
    },
    {
      name: "nothing-imports-a-route",
      comment: "What two routes share belongs in components/, services/ or domain/.",
      severity: "error",
      from: {},
      to: { path: "^app/routes/" },
    },
    {
      name: "no-circles",
      comment: "Two files that import each other, however far round, are one file or three.",
      severity: "error",
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ["type-only"] } },
    },
    {
      name: "every-own-import-is-found",
      comment: "An import of ours that this tool cannot follow would escape the arrows.",
      severity: "error",
      from: {},
      to: { couldNotResolve: true, path: "^(#|[.])", pathNot: "/[+]types/" },
    },
  ],
  options: {
    doNotFollow: { path: "node_modules" },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: "tsconfig.json" },
    enhancedResolveOptions: {
      extensions: [".ts", ".tsx", ".mjs", ".js", ".json"],
      conditionNames: ["import", "node", "default"],
    },
  },
};
