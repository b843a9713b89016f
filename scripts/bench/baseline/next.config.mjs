export default { poweredByHeader: false, serverExternalPackages: ['pg'] }
