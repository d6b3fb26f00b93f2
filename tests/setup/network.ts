import nock from 'nock';

// No test may leave this machine; fakes and the database answer on loopback.
nock.disableNetConnect();
nock.enableNetConnect(/^(127\.0\.0\.1|localhost|\[::1\])/);
