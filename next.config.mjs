/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  serverExternalPackages: ['sequelize', 'graphile-worker', 'pdfkit', 'bwip-js', 'sharp', 'pino'],
}
export default config
