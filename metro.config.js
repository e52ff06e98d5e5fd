const { getDefaultConfig } = require('expo/metro-config');

const config = getDefaultConfig(__dirname);
config.resolver.blockList = [/\/\.data\/.*/, /\/tests\/.*/, /\/server\/.*/];

module.exports = config;
