export default { permalink: '/conventions/index.html', up: '../' }
