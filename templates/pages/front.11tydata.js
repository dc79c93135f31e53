export default { permalink: '/index.html', up: '' }
