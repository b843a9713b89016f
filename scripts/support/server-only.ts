// Stands in for the package of this name, which refuses to load outside the framework's server build.
export {}
